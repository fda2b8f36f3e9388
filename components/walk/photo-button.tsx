'use client';

import { useId, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { sha256Of } from '@/lib/walk/photo-store';
import type { Draft, Walk } from '@/lib/walk/use-walk';

const ACCEPTED = ['image/jpeg', 'image/png', 'image/webp'];
const MOST_BYTES = 25 * 1024 * 1024;
export type PhotoSubject = { receptacleId?: string; areaId?: string; circuitId?: string };

/** Camera or files, several at once; each is on this phone before "saved" is said. */
export function PhotoButton({
  walk,
  subject,
  camera = true,
  label = 'Photo',
}: {
  walk: Walk;
  subject: PhotoSubject | (() => Promise<PhotoSubject>);
  camera?: boolean;
  label?: string;
}) {
  const id = useId();
  const [says, setSays] = useState('');

  async function take(files: File[]) {
    setSays('Saving…');
    const refused = files.map(refusalOf).filter((reason) => reason !== undefined);
    const good = files.filter((file) => refusalOf(file) === undefined);
    if (good.length > 0) {
      const belongsTo = typeof subject === 'function' ? await subject() : subject;
      await savePhotos(walk, belongsTo, good);
    }
    const saved =
      good.length > 0 ? `${good.length === 1 ? 'Photo' : `${good.length} photos`} saved on this phone.` : '';
    setSays([saved, ...refused].filter(Boolean).join(' '));
  }

  return (
    <div className="grid gap-1">
      <label
        htmlFor={id}
        className="flex min-h-[56px] cursor-pointer items-center justify-center rounded-[2px] border-(length:--line-2) border-ink px-4 text-center font-bold focus-within:shadow-[var(--focus)]"
      >
        {label}
        <input
          id={id}
          type="file"
          accept={ACCEPTED.join(',')}
          multiple
          capture={camera ? 'environment' : undefined}
          className="sr-only"
          onChange={(event) => {
            const files = Array.from(event.target.files ?? []);
            event.target.value = '';
            if (files.length > 0) void take(files);
          }}
        />
      </label>
      <p role="status" className="text-s empty:hidden">
        {says}
      </p>
    </div>
  );
}

function refusalOf(file: File): string | undefined {
  if (!ACCEPTED.includes(file.type))
    return `${file.name} is not a JPEG, PNG or WebP picture. Take it again with the camera, or save it as JPEG.`;
  if (file.size > MOST_BYTES) return `${file.name} is over 25 MB. Choose a smaller size in the camera settings.`;
  if (file.size === 0) return `${file.name} is empty. Take it again.`;
  return undefined;
}

/** Bytes of our own: a File only points at one that the system may take away. */
async function ownCopy(file: File) {
  const blob = new Blob([await file.arrayBuffer()], { type: file.type });
  return {
    id: uuidv7(),
    blob,
    type: file.type,
    takenAt: new Date(file.lastModified).toISOString(),
    sha256: await sha256Of(blob),
  };
}

async function savePhotos(walk: Walk, subject: PhotoSubject, files: File[]) {
  const last = Math.max(0, ...(walk.state?.photos.map((photo) => photo.order) ?? []));
  const photos = await Promise.all(files.map(ownCopy));
  const drafts: Draft[] = photos.map((photo, index) => ({
    op: 'photo.add',
    id: photo.id,
    ...subject,
    sha256: photo.sha256,
    bytes: photo.blob.size,
    type: photo.type as 'image/jpeg',
    order: last + index + 1,
    takenAt: photo.takenAt,
  }));
  await walk.save(
    drafts,
    photos.map(({ id, blob, type }) => ({ id, blob, type })),
  );
}
