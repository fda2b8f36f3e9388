import 'server-only';

import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import sharp from 'sharp';

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
  const refusal = await refusalOf(path);
  if (refusal) return { kind: 'refused', says: refusal };
  try {
    const source = sharp(path, { limitInputPixels: MOST_PIXELS, failOn: 'error', animated: false });
    const { format } = await source.metadata();
    const upright = source.autoOrient().flatten({ background: '#ffffff' }).toColorspace('srgb');
    const wide = await upright
      .resize(WIDE, WIDE, { fit: 'inside', withoutEnlargement: true })
      .jpeg(JPEG)
      .toBuffer({ resolveWithObject: true });
    const small = await sharp(wide.data)
      .resize(SMALL, SMALL, { fit: 'inside', withoutEnlargement: true })
      .jpeg(JPEG)
      .toBuffer();
    return {
      kind: 'taken-in',
      type: FORMATS[format ?? ''] ?? 'image/jpeg',
      sha256: await sha256OfFile(path),
      width: wide.info.width,
      height: wide.info.height,
      wide: wide.data,
      small,
    };
  } catch {
    return { kind: 'refused', says: 'This picture is damaged or not complete. Take it again.' };
  }
}

async function refusalOf(path: string): Promise<string | undefined> {
  // Reads the head of the file only, so that the size can be told before anything unfolds.
  const metadata = await sharp(path, { limitInputPixels: false })
    .metadata()
    .catch(() => null);
  if (!metadata?.format || !(metadata.format in FORMATS))
    return 'This file is not a JPEG, PNG or WebP picture. Take it again with the camera, or save it as JPEG.';
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
