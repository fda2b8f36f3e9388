import { createReadStream } from 'node:fs';
import { mkdtemp, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import sharp from 'sharp';
import { localStorage } from '@/lib/storage/local';
import { takeInPhoto } from '@/lib/storage/photo-intake';
import { compare, ms, type Measured } from './measure';

const ROUNDS = 7;

/** A 12-megapixel JPEG to stored original, 1600 px and 480 px, against one 1600 px pass that stores nothing. */
export async function photoRow(): Promise<Measured> {
  const folder = await mkdtemp(path.join(tmpdir(), 'ohmstead-bench-'));
  try {
    const file = path.join(folder, 'photo.jpg');
    await writeFile(file, await noisyPhoto());
    const { size } = await stat(file);
    const store = localStorage(path.join(folder, 'store'));
    let count = 0;
    const intake = () => takeInAndStore(store, file, (count += 1));
    const { floorMs, productMs, ratio } = await compare(ROUNDS, () => onePass(file), intake);
    return {
      what: `photo intake, 12 MP JPEG of ${(size / 1e6).toFixed(1)} MB, original and two copies stored`,
      product: ms(productMs),
      floor: `one 1600 px sharp pass, ${ms(floorMs)}`,
      ratio,
      bar: 'at most 1.3',
    };
  } finally {
    await rm(folder, { recursive: true });
  }
}

/** As the photo route does it, without the upload and the row. */
async function takeInAndStore(store: ReturnType<typeof localStorage>, file: string, count: number): Promise<void> {
  const taken = await takeInPhoto(file);
  if (taken.kind === 'refused') throw new Error(taken.says);
  await store.putIfAbsent(`photo/${count}/original`, createReadStream(file));
  await store.putIfAbsent(`photo/${count}/1600`, taken.wide);
  await store.putIfAbsent(`photo/${count}/480`, taken.small);
}

function onePass(file: string): Promise<Buffer> {
  return sharp(file)
    .autoOrient()
    .resize(1600, 1600, { fit: 'inside' })
    .jpeg({ quality: 82, chromaSubsampling: '4:2:0' })
    .toBuffer();
}

function noisyPhoto(): Promise<Buffer> {
  const noise = { type: 'gaussian', mean: 128, sigma: 12 } as const;
  return sharp({ create: { width: 4000, height: 3000, channels: 3, background: '#808080', noise } })
    .jpeg({ quality: 82 })
    .toBuffer();
}
