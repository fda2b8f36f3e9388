import type { PhonePhoto, PhoneStore } from './phone-store';

/**
 * Sends photos whose announcement the server has counted; each stays on the phone until the server says it has it.
 * True where the server answered for any of them.
 */
export async function sendPhotos(store: PhoneStore, userId: string): Promise<boolean> {
  const waiting = await store.photos.where('[userId+state]').anyOf([userId, 'waiting'], [userId, 'sending']).toArray();
  let answered = false;
  for (const photo of waiting) {
    if (!(await isAnnounced(store, userId, photo.id))) continue;
    const outcome = await sendPhoto(store, photo);
    if (outcome === 'unreachable') return answered;
    answered = true;
  }
  return answered;
}

async function isAnnounced(store: PhoneStore, userId: string, photoId: string): Promise<boolean> {
  const pending = await store.outbox
    .where('[userId+state+n]')
    .between([userId, 'pending', 0], [userId, 'pending', Infinity])
    .toArray();
  return !pending.some((entry) => entry.operation.op === 'photo.add' && entry.operation.id === photoId);
}

async function sendPhoto(store: PhoneStore, photo: PhonePhoto): Promise<'stored' | 'refused' | 'unreachable'> {
  await store.photos.update(photo.id, { state: 'sending', sentBytes: 0 });
  const form = new FormData();
  form.append('photo', photo.blob, 'photo');
  const answer = await upload(
    `/api/photos/${photo.id}`,
    form,
    (sentBytes) => void store.photos.update(photo.id, { sentBytes }),
  );
  if (answer.status === 200 || answer.status === 201) {
    await store.photos.delete(photo.id);
    return 'stored';
  }
  if (answer.status >= 400 && answer.status < 500 && ![401, 408, 409, 429].includes(answer.status)) {
    await store.photos.update(photo.id, {
      state: 'refused',
      reason: answer.says ?? 'This photo could not be read. Take it again.',
    });
    return 'refused';
  }
  await store.photos.update(photo.id, { state: 'waiting', sentBytes: 0 });
  return 'unreachable';
}

/** XMLHttpRequest, because fetch does not tell how much of an upload has gone. */
function upload(
  path: string,
  body: FormData,
  onProgress: (bytes: number) => void,
): Promise<{ status: number; says?: string }> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest();
    request.open('POST', path);
    request.responseType = 'json';
    request.upload.onprogress = (event) => onProgress(event.loaded);
    request.onload = () =>
      resolve({ status: request.status, says: (request.response as { error?: string } | null)?.error });
    request.onerror = () => resolve({ status: 0 });
    request.ontimeout = () => resolve({ status: 0 });
    request.timeout = 120_000;
    request.send(body);
  });
}

export async function sha256Of(blob: Blob): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await blob.arrayBuffer());
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('');
}
