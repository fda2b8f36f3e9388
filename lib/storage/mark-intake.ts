import 'server-only';
import { createHash } from 'node:crypto';
import sharp from 'sharp';

const MOST_PIXELS = 25_000_000;
const FORMATS = ['jpeg', 'png'];

export type MarkOutcome = { kind: 'taken-in'; png: Buffer; sha256: string } | { kind: 'refused' };

/** A logo or a signature: read by its content, turned upright, drawn anew as PNG, so that nothing hidden in it stays. */
export async function takeInMark(path: string): Promise<MarkOutcome> {
  try {
    const source = sharp(path, { limitInputPixels: MOST_PIXELS, failOn: 'error' });
    const { format } = await source.metadata();
    if (!FORMATS.includes(format ?? '')) return { kind: 'refused' };
    const png = await source
      .autoOrient()
      .resize(1200, 600, { fit: 'inside', withoutEnlargement: true })
      .toColorspace('srgb')
      .png()
      .toBuffer();
    return { kind: 'taken-in', png, sha256: createHash('sha256').update(png).digest('hex') };
  } catch {
    return { kind: 'refused' };
  }
}
