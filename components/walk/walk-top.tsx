'use client';

import type { ReactNode } from 'react';
import type { Walk } from '@/lib/walk/use-walk';
import { addressOf, type WalkView } from './walk-address';

export type StillOff = { receptacleId: string; readingId: string; place: string };

/** Stays on top of every screen until each point is back on or handed over. */
export function StillOffBar({
  inspectionId,
  points,
  thin,
}: {
  inspectionId: string;
  points: StillOff[];
  thin: boolean;
}) {
  if (points.length === 0) return null;
  return (
    <aside
      aria-label="Still off"
      className="flex items-center justify-between gap-4 bg-inverse px-4 py-2 text-on-inverse"
    >
      <p>
        <b>Still off: {points.length}</b>
        {!thin && <span className="block text-s">{points.map((point) => point.place).join('; ')}.</span>}
      </p>
      <a
        className="flex min-h-[44px] items-center font-bold underline underline-offset-4"
        href={addressOf(inspectionId, { kind: 'still-off' })}
      >
        Put back on
      </a>
    </aside>
  );
}

const LINK_WORDS = {
  connected: '',
  'no-signal': 'No connection.',
  'signed-out': 'You are signed out.',
  'out-of-date': 'This app is out of date. Reload it.',
} as const;

/** What is on this phone only, in words. */
export function OutboxLine({ inspectionId, walk }: { inspectionId: string; walk: Walk }) {
  const waiting = walk.outbox.filter((entry) => entry.state === 'pending').length;
  const held = walk.outbox.filter((entry) => entry.state === 'rejected' || entry.state === 'conflict').length;
  const photos = walk.photos.length;
  const words = [
    LINK_WORDS[walk.link],
    waitingWords(waiting, photos),
    held > 0 && `${count(held, 'change')} to look at.`,
  ]
    .filter(Boolean)
    .join(' ');
  return (
    // Always there and of one height: a line that came and went would move every button under the thumb.
    <p
      role="status"
      className={`flex min-h-[44px] flex-wrap items-center gap-x-2 border-b px-4 text-s ${words ? 'border-dashed border-rule' : 'border-hairline text-ink-2'}`}
    >
      {words || 'Everything is backed up.'}{' '}
      {walk.link === 'signed-out' && (
        <a className="font-bold underline" href={`/sign-in?next=${encodeURIComponent(`/walk#${inspectionId}`)}`}>
          Sign in to send it
        </a>
      )}
      {(held > 0 || photos > 0) && (
        <a
          className="inline-flex min-h-[44px] items-center font-bold underline"
          href={addressOf(inspectionId, { kind: 'waiting' })}
        >
          See what waits
        </a>
      )}
    </p>
  );
}

export function count(n: number, noun: string): string {
  return `${n} ${noun}${n === 1 ? '' : 's'}`;
}

function waitingWords(operations: number, photos: number): string {
  const parts = [operations > 0 && count(operations, 'change'), photos > 0 && count(photos, 'photo')].filter(Boolean);
  if (parts.length === 0) return '';
  return `${parts.join(' and ')} on this phone only.`;
}

export function WalkHeader({
  inspectionId,
  back,
  backLabel,
  title,
  under,
  children,
}: {
  inspectionId: string;
  back?: WalkView;
  backLabel: string;
  title: string;
  under?: string;
  children?: ReactNode;
}) {
  const href = back ? addressOf(inspectionId, back) : `/inspections/${inspectionId}`;
  return (
    <header className="flex items-center gap-3 border-b border-hairline px-2 py-2">
      <a href={href} aria-label={backLabel} className="grid size-[56px] shrink-0 place-items-center text-xl">
        <span aria-hidden="true">←</span>
      </a>
      <div className="min-w-0 grow">
        <h1 className="truncate font-serif text-l font-bold" tabIndex={-1}>
          {title}
        </h1>
        {under && <p className="truncate text-s text-ink-2">{under}</p>}
      </div>
      {children}
    </header>
  );
}
