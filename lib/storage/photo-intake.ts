import 'server-only';

import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import sharp, { type Metadata, type Sharp } from 'sharp';

const MOST_PIXELS = 50_000_000;
const FORMATS: Record<string, string> = { jpeg: 'image/jpeg', png: 'image/png', webp: 'image/webp' };
const WIDE = 1600;
const SMALL = 480;
const JPEG = { quality: 82, chromaSubsampling: '4:2:0' } as const;

sharp.block({
  operation: ['VipsForeignLoadSvg', 'VipsForeignLoadNsgif', 'VipsForeignLoadTiff', 'VipsForeignLoadVips'],
});
// The web process answers people too: one picture at a time leaves it a core.
sharp.concurrency(1);

export type TakenIn = {
  kind: 'taken-in';
  type: string;
  sha256: string;
  width: number;
  height: number;
  wide: Buffer;
  small: Buffer;
};
export type IntakeOutcome = TakenIn | { kind: 'refused'; says: string };

/** Reads a picture by its content, turns it upright, and makes the two copies that may be shared: no place, no serial number. */
export async function takeInPhoto(path: string): Promise<IntakeOutcome> {
  const source = sharp(path, { limitInputPixels: MOST_PIXELS, failOn: 'error', animated: false });
  const metadata = await source.metadata().catch(() => null);
  const refusal = refusalOf(metadata);
  if (refusal || !metadata) return { kind: 'refused', says: refusal ?? NOT_A_PICTURE };
  try {
    const [copies, sha256] = await Promise.all([makeCopies(source), sha256OfFile(path)]);
    return { kind: 'taken-in', type: FORMATS[metadata.format ?? ''] ?? 'image/jpeg', sha256, ...copies };
  } catch {
    return { kind: 'refused', says: 'This picture is damaged or not complete. Take it again.' };
  }
}

/** The large picture is decoded once; both copies are written from its 1600 px pixels. */
async function makeCopies(source: Sharp): Promise<Pick<TakenIn, 'width' | 'height' | 'wide' | 'small'>> {
  const { data, info } = await source
    .autoOrient()
    .flatten({ background: '#ffffff' })
    .toColorspace('srgb')
    .resize(WIDE, WIDE, { fit: 'inside', withoutEnlargement: true })
    .raw()
    .toBuffer({ resolveWithObject: true });
  const { width, height, channels } = info;
  const pixels = () => sharp(data, { raw: { width, height, channels } });
  const wide = await pixels().jpeg(JPEG).toBuffer();
  const small = await pixels().resize(SMALL, SMALL, { fit: 'inside', withoutEnlargement: true }).jpeg(JPEG).toBuffer();
  return { width, height, wide, small };
}

const NOT_A_PICTURE =
  'This file is not a JPEG, PNG or WebP picture. Take it again with the camera, or save it as JPEG.';

function refusalOf(metadata: Metadata | null): string | undefined {
  if (!metadata?.format || !(metadata.format in FORMATS)) return NOT_A_PICTURE;
  if ((metadata.pages ?? 1) > 1) return 'Moving pictures cannot be used. Take a still photo.';
  if (metadata.width * metadata.height > MOST_PIXELS)
    return 'This picture has over 50 million pixels. Choose a smaller size in the camera settings.';
  return undefined;
}

export async function sha256OfFile(path: string): Promise<string> {
  const hash = createHash('sha256');
  for await (const piece of createReadStream(path)) hash.update(piece as Buffer);
  return hash.digest('hex');
}
