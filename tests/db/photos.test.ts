import { v7 as uuidv7 } from 'uuid';
import { expect, test } from 'vitest';
import type { RecipientActor } from '@/db/actor';
import { findPhoto, listPhotos, recordRefused, recordStored } from '@/db/photos';
import { createFirm, logReceptacle, TestPhone } from '../support/firm';
import { asOwner } from '../support/owner';
import { releaseForTest } from '../support/released';

const SHA = 'a'.repeat(64);
const MADE = { sha256: SHA, width: 4000, height: 3000, sha256Of1600: 'b'.repeat(64), sha256Of480: 'c'.repeat(64) };

async function announced() {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const { receptacleId } = await logReceptacle(phone, firm.inspection.structureId);
  const announce = async (order: number, sha256 = SHA) => {
    const id = uuidv7();
    await phone.put({ op: 'photo.add', id, receptacleId, sha256, bytes: 9, type: 'image/jpeg', order });
    return id;
  };
  return { firm, phone, announce, photoId: await announce(1) };
}

test('a photo is stored when the bytes that were announced arrived, and the phone hears of it once', async () => {
  const { firm, phone, photoId } = await announced();
  const before = (await phone.see()).inspection.version;
  expect(await recordStored(firm.inspector, photoId, { ...MADE, sha256: 'f'.repeat(64) })).toEqual({
    kind: 'other-bytes',
  });
  expect((await findPhoto(firm.inspector, photoId))?.state).toBe('announced');
  expect(await recordStored(firm.inspector, photoId, MADE)).toEqual({ kind: 'recorded' });
  expect(await recordStored(firm.inspector, photoId, MADE)).toEqual({ kind: 'recorded' });
  expect(await findPhoto(firm.inspector, photoId)).toMatchObject({ state: 'stored', width: 4000, height: 3000 });
  const { inspection, photos } = await phone.see();
  expect(photos).toMatchObject([{ id: photoId, state: 'stored' }]);
  expect(inspection.version).toBe(before + 1);
});

test('a refused photo says why, may come again, and a stored one is not refused afterwards', async () => {
  const { firm, photoId, phone } = await announced();
  await recordRefused(firm.inspector, photoId, 'This file is not a picture.');
  expect((await phone.see()).photos).toMatchObject([{ state: 'refused', refusal: 'This file is not a picture.' }]);
  await recordStored(firm.inspector, photoId, MADE);
  await recordRefused(firm.inspector, photoId, 'Too late');
  const photo = await findPhoto(firm.inspector, photoId);
  expect([photo?.state, photo?.refusal]).toEqual(['stored', null]);
});

test('photos come in their order, without those deleted; the office stores none', async () => {
  const { firm, phone, photoId, announce } = await announced();
  const [last, first] = [await announce(3), await announce(0.5)];
  await phone.put({ op: 'photo.remove', id: last, base: {} });
  expect((await listPhotos(firm.office, firm.inspection.id)).map((photo) => photo.id)).toEqual([first, photoId]);
  expect(await findPhoto(firm.inspector, last)).toBeNull();
  expect(await recordStored(firm.office, photoId, MADE)).toEqual({ kind: 'not-found' });
});

test('a recipient finds the photos of the released version, also after one was deleted from the draft', async () => {
  const { firm, phone, photoId, announce } = await announced();
  const later = await announce(2, 'd'.repeat(64));
  await recordStored(firm.inspector, photoId, MADE);
  await recordStored(firm.inspector, later, { ...MADE, sha256: 'd'.repeat(64) });
  const released = await releaseForTest(firm, JSON.stringify({ schema: 1, photos: [photoId] }));
  const recipient: RecipientActor = { kind: 'recipient', firmId: firm.firmId, name: 'Bea Winter', ...released };
  await phone.put({ op: 'photo.remove', id: photoId, base: {} });
  expect((await findPhoto(recipient, photoId))?.id).toBe(photoId);
  expect(await findPhoto(recipient, later)).toBeNull();
});

test('an inspection holds four hundred photos and says so', async () => {
  const { firm, phone, announce } = await announced();
  await asOwner(
    `insert into photos (firm_id, id, inspection_id, "order", type, bytes, sha256, version)
     select $1, gen_random_uuid(), $2, n, 'image/jpeg', 9, '', 1 from generate_series(2, 400) n`,
    [firm.firmId, firm.inspection.id],
  );
  await expect(announce(401)).rejects.toThrow('400 photos');
  const [first] = (await phone.see()).photos;
  await phone.put({ op: 'photo.remove', id: first?.id ?? '', base: {} });
  await announce(402);
});
