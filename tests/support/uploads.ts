import { createHash } from 'node:crypto';
import { access, readdir } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { v7 as uuidv7 } from 'uuid';
import type { MemberActor } from '@/db/actor';
import { createFirm, logReceptacle, TestPhone } from './firm';
import { cookieOf, post } from './running';

export const sha256Of = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');

/** A firm with a receptacle, and its inspector's phone, which announces photos. */
export async function photographer() {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const { areaId, receptacleId } = await logReceptacle(phone, firm.inspection.structureId);
  const announce = (bytes: Buffer) => announcePhoto(phone, receptacleId, bytes);
  const take = async (bytes: Buffer) => {
    const photoId = await announce(bytes);
    return { photoId, response: await upload(photoId, firm.inspector, bytes) };
  };
  return { firm, phone, areaId, receptacleId, announce, take };
}

export async function announcePhoto(phone: TestPhone, receptacleId: string, bytes: Buffer): Promise<string> {
  const id = uuidv7();
  const size = Math.min(Math.max(bytes.length, 1), 25 * 1024 * 1024);
  const said = { sha256: sha256Of(bytes), bytes: size, type: 'image/jpeg' as const };
  await phone.put({ op: 'photo.add', id, receptacleId, order: 1, ...said });
  return id;
}

export async function upload(
  photoId: string,
  by: MemberActor | null,
  bytes: Buffer,
  name = 'photo.jpg',
  field = 'photo',
) {
  const form = new FormData();
  form.set(field, new File([new Uint8Array(bytes)], name, { type: 'image/jpeg' }));
  return post(`/api/photos/${photoId}`, by ? await cookieOf(by) : '', form);
}

const store = () => path.resolve(process.env.STORAGE_DIR ?? '');

/** Names of what the store holds of a photo, in order. */
export async function storedOf(firmId: string, photoId: string): Promise<string[]> {
  const folder = path.join(store(), 'firm', firmId, 'photo', photoId);
  return (await readdir(folder).catch(() => [])).toSorted();
}

export function storedPath(firmId: string, photoId: string, size: 'original' | '1600' | '480'): string {
  return path.join(store(), 'firm', firmId, 'photo', photoId, size);
}

/** Uploads on their way: the files of the temporary folder, and those that the store has not named yet. */
export async function underWay(): Promise<string[]> {
  const temporary = (await readdir(tmpdir())).filter((name) => /^ohmstead-[0-9a-f]{8}-[0-9a-f-]{27}$/.test(name));
  const incoming = await readdir(path.join(store(), 'incoming')).catch(() => []);
  return [...temporary, ...incoming];
}

export async function isThere(file: string): Promise<boolean> {
  return access(file).then(
    () => true,
    () => false,
  );
}
