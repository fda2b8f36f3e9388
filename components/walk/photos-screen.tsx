'use client';

import { useEffect, useMemo, useState } from 'react';
import type { WalkPhoto, WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { PhonePhoto } from '@/lib/walk/phone-store';
import type { Draft, Walk } from '@/lib/walk/use-walk';
import { PhotoButton } from './photo-button';
import { WalkButton } from './walk-button';

/** The photos of one receptacle: add, caption, order, delete with undo. */
export function PhotosScreen({
  walk,
  state,
  receptacle,
}: {
  walk: Walk;
  state: WalkState;
  receptacle: WalkReceptacle;
}) {
  const [deleted, setDeleted] = useState<WalkPhoto | null>(null);
  const photos = photosOf(state, receptacle.id);

  async function remove(photo: WalkPhoto) {
    await walk.save([{ op: 'photo.remove', id: photo.id, base: photo.revisions }]);
    setDeleted(photo);
  }
  async function restore() {
    if (deleted) await walk.save([{ op: 'photo.restore', id: deleted.id }]);
    setDeleted(null);
  }

  return (
    <div className="flex grow flex-col justify-between gap-5 px-4 py-4">
      <div className="grid gap-5">
        {photos.length === 0 && (
          <p className="font-serif text-l">
            No photo of this receptacle yet. Take one, or choose some from this device.
          </p>
        )}
        <ol className="grid gap-5">
          {photos.map((photo, index) => (
            <PhotoItem
              key={photo.id}
              walk={walk}
              photo={photo}
              kept={walk.photos.find((one) => one.id === photo.id)}
              number={index + 1}
              earlier={photos[index - 1]}
              onRemove={() => void remove(photo)}
            />
          ))}
        </ol>
      </div>
      <div className="sticky bottom-0 -mx-4 grid gap-2 border-t border-hairline bg-paper px-4 py-2">
        <p role="status" className="flex min-h-[44px] items-center justify-between gap-4 empty:hidden">
          {deleted && (
            <>
              <span>Photo deleted.</span>
              <WalkButton weight="quiet" onClick={() => void restore()}>
                Undo
              </WalkButton>
            </>
          )}
        </p>
        <div className="grid grid-cols-2 gap-2">
          <PhotoButton walk={walk} subject={{ receptacleId: receptacle.id }} label="Camera" />
          <PhotoButton walk={walk} subject={{ receptacleId: receptacle.id }} camera={false} label="From files" />
        </div>
      </div>
    </div>
  );
}

export function photosOf(state: WalkState, receptacleId: string): WalkPhoto[] {
  return state.photos
    .filter((photo) => photo.receptacleId === receptacleId && !photo.deleted)
    .toSorted((a, b) => a.order - b.order || a.id.localeCompare(b.id));
}

type PhotoItemProps = {
  walk: Walk;
  photo: WalkPhoto;
  kept?: PhonePhoto;
  number: number;
  earlier?: WalkPhoto;
  onRemove: () => void;
};

function PhotoItem({ walk, photo, kept, number, earlier, onRemove }: PhotoItemProps) {
  const [caption, setCaption] = useState(photo.caption);
  const source = useSource(photo, kept);
  const set = (patch: { caption?: string; order?: number }): Draft => ({
    op: 'photo.set',
    id: photo.id,
    patch,
    base: Object.fromEntries(Object.keys(patch).map((field) => [field, photo.revisions[field] ?? 0])),
  });
  async function moveUp() {
    if (!earlier) return;
    const swap: Draft = {
      op: 'photo.set',
      id: earlier.id,
      patch: { order: photo.order },
      base: { order: earlier.revisions.order ?? 0 },
    };
    await walk.save([set({ order: earlier.order }), swap]);
  }
  return (
    <li className="grid gap-2 border-b border-hairline pb-4">
      {source && <img src={source} alt={caption || `Photo ${number}`} className="w-full border border-hairline" />}
      <p className="text-s text-ink-2">
        Photo {number}: {stateWords(photo, kept)}
      </p>
      {kept?.state === 'sending' && (
        <progress className="w-full" max={kept.blob.size} value={kept.sentBytes}>
          {Math.round((100 * kept.sentBytes) / kept.blob.size)} %
        </progress>
      )}
      <label className="grid gap-1 font-bold">
        Caption
        <input
          className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
          maxLength={300}
          value={caption}
          onChange={(event) => setCaption(event.target.value)}
          onBlur={() => {
            if (caption.trim() !== photo.caption) void walk.save([set({ caption: caption.trim() })]);
          }}
        />
      </label>
      <div className="grid grid-cols-2 gap-2">
        {earlier ? <WalkButton onClick={() => void moveUp()}>Move up</WalkButton> : <span />}
        <WalkButton onClick={onRemove}>Delete</WalkButton>
      </div>
    </li>
  );
}

function stateWords(photo: WalkPhoto, kept: PhonePhoto | undefined): string {
  if (photo.state === 'stored') return 'backed up';
  if (photo.state === 'refused') return photo.refusal ?? 'it could not be read; take it again';
  if (kept?.state === 'refused') return kept.reason ?? 'it could not be read; take it again';
  if (!kept) return 'announced from another device, not arrived yet';
  return kept.state === 'sending' ? 'sending' : 'saved on this phone';
}

/** The stored copy, or the bytes that are still on this phone. */
function useSource(photo: WalkPhoto, kept: PhonePhoto | undefined): string | undefined {
  const blob = photo.state === 'stored' ? undefined : kept?.blob;
  const local = useMemo(() => (blob ? URL.createObjectURL(blob) : undefined), [blob]);
  useEffect(() => () => (local ? URL.revokeObjectURL(local) : undefined), [local]);
  return photo.state === 'stored' ? `/api/photos/${photo.id}?size=480` : local;
}
