import sharp from 'sharp';
import { crc32, deflateSync } from 'node:zlib';

/** A picture, red on its left half and blue on its right. */
export function redAndBlue(width = 200, height = 100) {
  const raw = Buffer.alloc(width * height * 3);
  for (let i = 0; i < width * height; i += 1) raw[i * 3 + (i % width < width / 2 ? 0 : 2)] = 255;
  return sharp(raw, { raw: { width, height, channels: 3 } });
}

/** Two frames, one above the other in memory. */
export function movingWebp(): Promise<Buffer> {
  const raw = Buffer.alloc(100 * 200 * 3, 40).fill(220, 0, 100 * 100 * 3);
  return sharp(raw, { raw: { width: 100, height: 200, channels: 3, pageHeight: 100 } })
    .webp({ loop: 0, delay: [100, 100] })
    .toBuffer();
}

/** A PNG of one bit a pixel: few bytes that unfold to a square of `side` pixels. */
export function bombPng(side: number): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(side, 0);
  header.writeUInt32BE(side, 4);
  header[8] = 1;
  const rows = deflateSync(Buffer.alloc((1 + Math.ceil(side / 8)) * side), { level: 9 });
  const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  return Buffer.concat([signature, chunk('IHDR', header), chunk('IDAT', rows), chunk('IEND', Buffer.alloc(0))]);
}

function chunk(name: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(name, 'latin1'), data]);
  const [length, sum] = [Buffer.alloc(4), Buffer.alloc(4)];
  length.writeUInt32BE(data.length);
  sum.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, sum]);
}

export const SECRETS = ['SN-998877', 'notes of the maker', 'Fairview by the creek', 'Penny Lowe'];

/** What a phone's camera writes: a place, a serial number, the maker's own notes, an author, and "turn me right". */
export async function phoneJpeg(): Promise<Buffer> {
  const plain = await redAndBlue().jpeg({ quality: 95, chromaSubsampling: '4:4:4' }).toBuffer();
  const xmp = `http://ns.adobe.com/xap/1.0/\0<x:xmpmeta xmlns:x="adobe:ns:meta/"><rdf:RDF
    xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#"><rdf:Description rdf:about=""
    xmlns:dc="http://purl.org/dc/elements/1.1/" dc:source="Fairview by the creek"/></rdf:RDF></x:xmpmeta>`;
  const exif = Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), tiff()]);
  const comment = segment(0xfe, Buffer.from('<script>alert(1)</script>'));
  return Buffer.concat([
    plain.subarray(0, 2),
    segment(0xe1, exif),
    segment(0xe1, Buffer.from(xmp)),
    comment,
    plain.subarray(2),
  ]);
}

function segment(marker: number, data: Buffer): Buffer {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(data.length + 2, 2);
  return Buffer.concat([head, data]);
}

type Entry = { tag: number; type: number; count: number; value: Buffer | number };

/** Three directories, as Exif lays them out: the picture's, the camera's and the place's. */
function tiff(): Buffer {
  const text = (tag: number, words: string): Entry => {
    const value = Buffer.from(`${words}\0`, 'latin1');
    return { tag, type: 2, count: value.length, value };
  };
  const degrees = (tag: number, whole: number): Entry => {
    const value = Buffer.alloc(24);
    [whole, 1, 3, 1, 0, 1].forEach((part, index) => value.writeUInt32LE(part, index * 4));
    return { tag, type: 5, count: 3, value };
  };
  const notes = Buffer.from('notes of the maker, and a number');
  const [camera, place] = [200, 400];
  const directories: [number, Entry[]][] = [
    [
      8,
      [
        { tag: 0x0112, type: 3, count: 1, value: 6 },
        text(0x013b, 'Penny Lowe'),
        { tag: 0x8769, type: 4, count: 1, value: camera },
        { tag: 0x8825, type: 4, count: 1, value: place },
      ],
    ],
    [camera, [{ tag: 0x927c, type: 7, count: notes.length, value: notes }, text(0xa431, 'SN-998877')]],
    [place, [text(1, 'N'), degrees(2, 44), text(3, 'W'), degrees(4, 123)]],
  ];
  const out = Buffer.alloc(600);
  out.write('II*\0', 'latin1');
  out.writeUInt32LE(8, 4);
  for (const [offset, entries] of directories) writeDirectory(out, offset, entries);
  return out;
}

/** The entries at an offset, and after them the values that do not fit into four bytes. */
function writeDirectory(out: Buffer, offset: number, entries: Entry[]): void {
  out.writeUInt16LE(entries.length, offset);
  let free = offset + 2 + entries.length * 12 + 4;
  entries.forEach(({ tag, type, count, value }, index) => {
    const entry = offset + 2 + index * 12;
    out.writeUInt16LE(tag, entry);
    out.writeUInt16LE(type, entry + 2);
    out.writeUInt32LE(count, entry + 4);
    if (typeof value === 'number') out.writeUInt32LE(value, entry + 8);
    else if (value.length <= 4) value.copy(out, entry + 8);
    else {
      out.writeUInt32LE(free, entry + 8);
      value.copy(out, free);
      free += value.length;
    }
  });
}
