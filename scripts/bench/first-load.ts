import { gzipSync } from 'node:zlib';
import { env } from '@/lib/env';
import type { Measured } from './measure';

/** Scripts that a browser fetches to show Walk, compressed, against those of the front page, which does nothing. */
export async function firstLoadRow(): Promise<Measured> {
  const [walk, front] = [await scriptBytes('/walk'), await scriptBytes('/')];
  return {
    what: 'first load of Walk, JavaScript compressed with gzip',
    product: kilobytes(walk),
    floor: `front page of the same build, ${kilobytes(front)}`,
    ratio: walk / front,
    bar: 'at most 320 kB',
  };
}

/** Every script that the page names, in a tag or in what it hands to React: a browser was seen to fetch just these. */
async function scriptBytes(path: string): Promise<number> {
  const html = await text(path);
  const modern = html.replace(/<script[^>]*nomodule[^>]*>/gi, '');
  const names = new Set(Array.from(modern.matchAll(/static\/chunks\/[\w.~/[\]%-]+?\.js/g), ([name]) => name));
  let bytes = 0;
  for (const name of names) bytes += gzipSync(await text(`/_next/${name}`)).length;
  return bytes;
}

async function text(path: string): Promise<string> {
  const answer = await fetch(new URL(path, env.APP_URL));
  if (!answer.ok) throw new Error(`${path} answered ${answer.status}`);
  return answer.text();
}

function kilobytes(bytes: number): string {
  return `${(bytes / 1000).toFixed(0)} kB`;
}
