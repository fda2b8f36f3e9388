'use client';

import type { OutboxEntry, PhonePhoto } from '@/lib/walk/phone-store';
import type { Walk } from '@/lib/walk/use-walk';
import { count } from './walk-top';
import { WalkButton } from './walk-button';

/** Everything that is on this phone only, and what the server would not take, with its reason. */
export function WaitingScreen({ walk, onDiscard }: { walk: Walk; onDiscard: (key: string) => void }) {
  const pending = walk.outbox.filter((entry) => entry.state === 'pending');
  const held = walk.outbox.filter((entry) => entry.state === 'rejected' || entry.state === 'conflict');
  return (
    <div className="grid gap-5 px-4 py-4">
      <p>
        {pending.length === 0
          ? 'Every change has reached the office.'
          : `${count(pending.length, 'change')} on this phone only.`}{' '}
        {walk.photos.length > 0 && `${count(walk.photos.length, 'photo')} not backed up.`}
      </p>
      <WalkButton onClick={() => void walk.refresh()}>Send now</WalkButton>
      {walk.photos.map((photo) => (
        <PhotoLine key={photo.id} photo={photo} />
      ))}
      {held.map((entry) => (
        <HeldEntry key={entry.key} entry={entry} onDiscard={onDiscard} />
      ))}
    </div>
  );
}

function PhotoLine({ photo }: { photo: PhonePhoto }) {
  const size = `${(photo.blob.size / 1024 / 1024).toFixed(1)} MB`;
  const words = {
    waiting: `Photo, ${size}: saved on this phone`,
    sending: `Photo, ${size}: sending`,
    stored: `Photo, ${size}: backed up`,
    refused: `Photo, ${size}: ${photo.reason ?? 'not taken'}`,
  }[photo.state];
  return (
    <div className="grid gap-1 border-t border-hairline pt-2">
      <p>{words}</p>
      {photo.state === 'sending' && (
        <progress className="w-full" max={photo.blob.size} value={photo.sentBytes}>
          {Math.round((100 * photo.sentBytes) / photo.blob.size)} %
        </progress>
      )}
    </div>
  );
}

function HeldEntry({ entry, onDiscard }: { entry: OutboxEntry; onDiscard: (key: string) => void }) {
  return (
    <section className="grid gap-2 border-t-2 border-ink pt-3">
      <h2 className="font-serif font-bold">
        {entry.state === 'conflict' ? 'Someone else changed this too' : 'This was not taken'}
      </h2>
      {entry.reason && <p>{entry.reason}</p>}
      {entry.conflicts?.map((conflict) => (
        <p key={conflict.id}>
          {conflict.field}: {conflict.by} has {String(conflict.theirs)}, you have {String(conflict.yours)}. Choose in
          Findings at the desk.
        </p>
      ))}
      <pre className="overflow-x-auto text-xs">{JSON.stringify(entry.operation, null, 1)}</pre>
      {entry.state === 'rejected' && (
        <div className="grid grid-cols-2 gap-2">
          <WalkButton onClick={() => void navigator.clipboard.writeText(JSON.stringify(entry.operation))}>
            Copy it
          </WalkButton>
          <WalkButton onClick={() => onDiscard(entry.key)}>Discard it</WalkButton>
        </div>
      )}
    </section>
  );
}
