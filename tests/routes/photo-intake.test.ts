import { execFileSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { request } from 'node:http';
import { readFile } from 'node:fs/promises';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { closeDatabase } from '@/db/client';
import { bombPng, movingWebp, phoneJpeg, redAndBlue, SECRETS } from '@/tests/support/pictures';
import { closeOwner } from '@/tests/support/owner';
import { app, at, cookieOf, expectSentence, get, post } from '@/tests/support/running';
import { photographer, sha256Of, storedOf, storedPath, underWay, upload } from '@/tests/support/uploads';

type Photographer = Awaited<ReturnType<typeof photographer>>;
let house: Photographer;

beforeAll(async () => {
  if (app) house = await photographer();
});
afterAll(async () => {
  await closeDatabase();
  await closeOwner();
});

const noise = (width: number, height: number) =>
  sharp(randomBytes(width * height * 3), { raw: { width, height, channels: 3 } });
const mp4 = Buffer.concat([Buffer.from('\0\0\0\x18ftypmp42\0\0\0\0mp42isom', 'latin1'), randomBytes(4000)]);
const svg = '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><script>alert(1)</script></svg>';

describe.skipIf(!app)('a photo that is sent', () => {
  test.each([
    ['JPEG', () => redAndBlue().jpeg().toBuffer()],
    ['PNG with transparency', () => redAndBlue().ensureAlpha(0.5).png().toBuffer()],
    ['PNG of 16 bits a channel', () => redAndBlue().toColorspace('rgb16').png().toBuffer()],
    ['WebP', () => redAndBlue().webp().toBuffer()],
    ['JPEG of printing inks', () => redAndBlue().toColorspace('cmyk').jpeg().toBuffer()],
    ['JPEG of one color', () => redAndBlue().grayscale().jpeg().toBuffer()],
  ])('%s is stored with its hash and two smaller copies', async (_, make) => {
    const bytes = await make();
    const { photoId, response } = await house.take(bytes);
    expect(response.status).toBe(201);
    expect(await response.json()).toEqual({ state: 'stored', sha256: sha256Of(bytes) });
    expect(await storedOf(house.firm.firmId, photoId)).toEqual(['1600', '480', 'original']);
    expect(sha256Of(await readFile(original(photoId)))).toBe(sha256Of(bytes));
    for (const size of ['1600', '480'] as const) {
      const copy = await sharp(storedPath(house.firm.firmId, photoId, size)).metadata();
      expect([copy.format, copy.space]).toEqual(['jpeg', 'srgb']);
    }
  });

  test('large ones are made smaller, small ones are left as large as they are', async () => {
    const large = await house.take(await noise(2400, 1800).jpeg().toBuffer());
    const small = await house.take(await redAndBlue(300, 200).jpeg().toBuffer());
    const sizeOf = async (photoId: string, size: '1600' | '480') => {
      const { width, height } = await sharp(storedPath(house.firm.firmId, photoId, size)).metadata();
      return [width, height];
    };
    expect([await sizeOf(large.photoId, '1600'), await sizeOf(large.photoId, '480')]).toEqual([
      [1600, 1200],
      [480, 360],
    ]);
    expect(await sizeOf(small.photoId, '1600')).toEqual([300, 200]);
  });

  test('twice is stored once', async () => {
    const bytes = await redAndBlue().jpeg().toBuffer();
    const photoId = await house.announce(bytes);
    const both = await Promise.all([1, 2].map(() => upload(photoId, house.firm.inspector, bytes)));
    const again = await upload(photoId, house.firm.inspector, bytes);
    for (const response of [...both, again]) {
      expect(response.ok).toBe(true);
      expect(await response.json()).toEqual({ state: 'stored', sha256: sha256Of(bytes) });
    }
    expect(again.status).toBe(200);
    expect((await house.phone.see()).photos.find((photo) => photo.id === photoId)?.state).toBe('stored');
  });

  test.each(['../../x.jpg', '..\\..\\x.jpg', '/etc/passwd', 'a\u202egpj.exe', '%2e%2e%2fx', 'x'.repeat(300), ''])(
    'named %j is stored under a name of ours',
    async (name) => {
      const bytes = await redAndBlue(40, 20).jpeg().toBuffer();
      const photoId = await house.announce(bytes);
      const response = await upload(photoId, house.firm.inspector, bytes, name);
      if (response.status !== 201) await expectRefused(response, 400, photoId);
      else expect(await storedOf(house.firm.firmId, photoId)).toEqual(['1600', '480', 'original']);
    },
  );
});

const REFUSED: [string, number, () => Buffer | Promise<Buffer>][] = [
  ['an empty file', 400, () => Buffer.alloc(0)],
  ['a text', 415, () => Buffer.from('no picture at all')],
  [
    'a page that begins like a JPEG',
    415,
    () => Buffer.from('\xff\xd8\xff\xe0<html><script>alert(1)</script>', 'latin1'),
  ],
  ['a page', 415, () => Buffer.from('<!doctype html><script>alert(1)</script>')],
  ['a film', 415, () => mp4],
  ['an SVG', 415, () => Buffer.from(svg)],
  ['a GIF', 415, () => redAndBlue().gif().toBuffer()],
  ['a TIFF', 415, () => redAndBlue().tiff().toBuffer()],
  ['an AVIF', 415, () => redAndBlue().avif().toBuffer()],
  ['moving pictures', 415, movingWebp],
  ['half a JPEG', 415, async () => halfOf(await noise(400, 300).jpeg().toBuffer())],
  ['half a PNG', 415, async () => halfOf(await noise(400, 300).png().toBuffer())],
  ['half a WebP', 415, async () => halfOf(await noise(400, 300).webp().toBuffer())],
  ['a JPEG without its end', 415, async () => (await noise(400, 300).jpeg().toBuffer()).subarray(0, -600)],
  ['few bytes that unfold to 196 million pixels', 415, () => bombPng(14_000)],
  ['few bytes that unfold to 4 thousand million pixels', 415, () => hugeHeader(65_000)],
  ['26 MB', 413, () => Buffer.concat([Buffer.from('\xff\xd8\xff', 'latin1'), Buffer.alloc(26 * 1024 * 1024)])],
];

describe.skipIf(!app)('a file that is no photo', () => {
  test.each(REFUSED)('%s is refused with a reason, and nothing of it stays', async (what, status, make) => {
    const before = new Set(await underWay());
    const { photoId, response } = await house.take(await make());
    await expectRefused(response, status, photoId);
    await vi.waitFor(async () => expect((await underWay()).filter((name) => !before.has(name))).toEqual([]), 10_000);
    expect((await get('/api/health')).status, what).toBe(200);
  });

  test('says of too many pixels, of moving pictures and of size what it is', async () => {
    const says = async (bytes: Buffer) => {
      const { response } = await house.take(bytes);
      return ((await response.json()) as { error: string }).error;
    };
    expect(await says(bombPng(14_000))).toContain('50 million pixels');
    expect(await says(await movingWebp())).toContain('still photo');
    expect(await says(Buffer.alloc(26 * 1024 * 1024, 1))).toContain('25 MB');
  });

  test('is refused to the phone too, with the reason, and the right photo may follow', async () => {
    const bytes = await redAndBlue().jpeg().toBuffer();
    const photoId = await house.announce(bytes);
    await upload(photoId, house.firm.inspector, Buffer.from(svg));
    const seen = async () => (await house.phone.see()).photos.find((photo) => photo.id === photoId);
    expect(await seen()).toMatchObject({ state: 'refused' });
    expectSentence((await seen())?.refusal?.split('. ')[0]?.concat('.'));
    expect((await upload(photoId, house.firm.inspector, bytes)).status).toBe(201);
    expect(await seen()).toMatchObject({ state: 'stored' });
  });

  test('in a form that is not as it must be is refused', async () => {
    const bytes = await redAndBlue().jpeg().toBuffer();
    const photoId = await house.announce(bytes);
    const path = `/api/photos/${photoId}`;
    const cookie = await cookieOf(house.firm.inspector);
    await expectRefused(
      await post(path, cookie, new Uint8Array(bytes), { 'content-type': 'image/jpeg' }),
      415,
      photoId,
    );
    await expectRefused(await post(path, cookie, 'x', { 'content-type': 'multipart/form-data' }), 400, photoId);
    const torn = '--b\r\ncontent-disposition: form-data; name="photo"; filename="a.jpg"\r\n\r\nabc';
    await expectRefused(
      await post(path, cookie, torn, { 'content-type': 'multipart/form-data; boundary=b' }),
      400,
      photoId,
    );
    for (const field of ['', 'image', '__proto__', 'photo[0]', 'a[b]'.repeat(200)]) {
      await expectRefused(await upload(photoId, house.firm.inspector, bytes, 'a.jpg', field), 400, photoId);
    }
    const many = new FormData();
    for (let n = 0; n < 2000; n += 1) many.set(`a[${n}]`, 'x');
    await expectRefused(await post(path, cookie, many), 400, photoId);
    expect((await upload(photoId, house.firm.inspector, bytes)).status).toBe(201);
  });

  test('that breaks off on its way leaves nothing', async () => {
    const photoId = await house.announce(Buffer.from('x'));
    const before = new Set(await underWay());
    const cookie = await cookieOf(house.firm.inspector);
    await Promise.all(Array.from({ length: 20 }, () => breakOff(`/api/photos/${photoId}`, cookie)));
    await vi.waitFor(async () => expect((await underWay()).filter((name) => !before.has(name))).toEqual([]), 20_000);
    expect(await storedOf(house.firm.firmId, photoId)).toEqual([]);
    expect((await get('/api/health')).status).toBe(200);
  });
});

describe.skipIf(!app)('other bytes than those announced', () => {
  test('are refused, are not kept, and do not stand in the way of the right ones', async () => {
    const right = await redAndBlue().jpeg().toBuffer();
    const photoId = await house.announce(right);
    await expectRefused(
      await upload(photoId, house.firm.inspector, await redAndBlue(90, 90).png().toBuffer()),
      409,
      photoId,
    );
    expect((await upload(photoId, house.firm.inspector, right)).status).toBe(201);
    expect(sha256Of(await readFile(original(photoId)))).toBe(sha256Of(right));
    expect((await sharp(storedPath(house.firm.firmId, photoId, '1600')).metadata()).width).toBe(200);
  });
});

describe.skipIf(!app)('what a camera writes into a photo', () => {
  test('is in the original and in neither copy; the picture stands upright', async () => {
    const bytes = await phoneJpeg();
    const { photoId } = await house.take(bytes);
    expect(sha256Of(await readFile(original(photoId)))).toBe(sha256Of(bytes));
    for (const secret of SECRETS) expect(bytes.includes(secret), secret).toBe(true);
    expect(tagsOf(original(photoId)).join()).toMatch(/Comment.*MakerNote.*SerialNumber.*GPSLatitude.*XMP/);
    for (const size of ['1600', '480'] as const) {
      const file = storedPath(house.firm.firmId, photoId, size);
      expect(tagsOf(file).filter((tag) => !/^(ExifTool|System|File|JFIF|ICC_Profile|Composite):/.test(tag))).toEqual(
        [],
      );
      expect(tagsOf(file).filter((tag) => /GPS|Serial|Maker|Owner|Comment|Orientation|Artist/i.test(tag))).toEqual([]);
      const copy = await readFile(file);
      for (const secret of [...SECRETS, '<script']) expect(copy.includes(secret), secret).toBe(false);
      await expectUpright(copy);
    }
  });
});

/** Turned by a quarter clockwise, the red left half is on top. */
async function expectUpright(copy: Buffer): Promise<void> {
  const { data, info } = await sharp(copy).raw().toBuffer({ resolveWithObject: true });
  expect([info.width, info.height]).toEqual([100, 200]);
  const pixel = (x: number, y: number) => [...data.subarray((y * info.width + x) * info.channels).subarray(0, 3)];
  const [topRed = 0, , topBlue = 0] = pixel(50, 20);
  const [lowRed = 0, , lowBlue = 0] = pixel(50, 180);
  expect(topRed).toBeGreaterThan(topBlue + 100);
  expect(lowBlue).toBeGreaterThan(lowRed + 100);
}

function original(photoId: string): string {
  return storedPath(house.firm.firmId, photoId, 'original');
}

function tagsOf(file: string): string[] {
  const [tags] = JSON.parse(execFileSync('exiftool', ['-G', '-a', '-u', '-U', '-j', file]).toString()) as object[];
  return Object.keys(tags ?? {}).filter((tag) => tag !== 'SourceFile');
}

async function expectRefused(response: Response, status: number, photoId: string): Promise<void> {
  const { error } = (await response.json()) as { error: unknown };
  expect(response.status, String(error)).toBe(status);
  expectSentence(error);
  expect(await storedOf(house.firm.firmId, photoId)).toEqual([]);
}

const halfOf = (bytes: Buffer) => bytes.subarray(0, bytes.length / 2);

function hugeHeader(side: number): Buffer {
  const small = bombPng(8);
  small.writeUInt32BE(side, 16);
  small.writeUInt32BE(side, 20);
  return small;
}

/** Sends the beginning of a form and hangs up. */
function breakOff(path: string, cookie: string): Promise<void> {
  const headers = {
    cookie,
    origin: at('/').origin,
    'content-type': 'multipart/form-data; boundary=b',
    'content-length': 4_000_000,
  };
  return new Promise((resolve) => {
    const sent = request(at(path), { method: 'POST', headers });
    sent.on('error', () => resolve());
    sent.on('close', () => resolve());
    sent.write('--b\r\ncontent-disposition: form-data; name="photo"; filename="a.jpg"\r\n\r\n');
    sent.write(randomBytes(200_000), () => setTimeout(() => sent.destroy(), 50));
  });
}
