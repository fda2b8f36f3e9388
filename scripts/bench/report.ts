import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { canonicalJson, type ReportSnapshot, type SnapshotPhoto } from '@/lib/schemas/snapshot';
import { goldenSnapshot } from '../../tests/support/snapshot';

const PHOTOS = 80;
const RECEPTACLES = 60;
const FINDINGS = 34;

export type LargeReport = { snapshot: ReportSnapshot; sha256: string; photos: Map<string, Buffer> };

/** The tests' invented report grown to a large house: 80 photos of 1024 px, 60 receptacles, about 40 pages. */
export async function largeReport(): Promise<LargeReport> {
  const { snapshot: small } = await goldenSnapshot();
  const [model] = small.photos;
  const [row] = small.log;
  if (!model || !row) throw new Error('the golden report has no photo or no log');
  const photos = new Map<string, Buffer>();
  const listed: SnapshotPhoto[] = [];
  for (let n = 0; n < PHOTOS; n += 1) {
    const bytes = await noisyPhoto();
    photos.set(idOf(1000 + n), bytes);
    listed.push({ ...model, id: idOf(1000 + n), number: n + 1, sha256Of1600: hash(bytes), width: 1024, height: 768 });
  }
  const snapshot: ReportSnapshot = {
    ...small,
    photos: listed,
    findings: Array.from({ length: FINDINGS }, (_, n) => findingOf(small, n)),
    log: Array.from({ length: RECEPTACLES }, (_, n) => ({
      ...(small.log[n % small.log.length] ?? row),
      receptacleId: idOf(2000 + n),
      number: n + 1,
      findings: n < FINDINGS ? [n + 1] : [],
    })),
  };
  return { snapshot, sha256: hash(canonicalJson(snapshot)), photos };
}

/** The first findings take four photos each. */
function findingOf({ findings }: ReportSnapshot, n: number): ReportSnapshot['findings'][number] {
  const model = findings[n % findings.length];
  if (!model) throw new Error('the golden report has no finding');
  const own = [0, 1, 2, 3].map((k) => n * 4 + k).filter((photo) => photo < PHOTOS);
  return {
    ...model,
    id: `${model.code}:${n}`,
    number: n + 1,
    receptacleIds: [idOf(2000 + n)],
    photoIds: own.map((photo) => idOf(1000 + photo)),
  };
}

function noisyPhoto(): Promise<Buffer> {
  const noise = { type: 'gaussian', mean: 128, sigma: 12 } as const;
  return sharp({ create: { width: 1024, height: 768, channels: 3, background: '#808080', noise } })
    .jpeg({ quality: 82 })
    .toBuffer();
}

function idOf(n: number): string {
  return `0192f0aa-0000-7000-8000-${String(n).padStart(12, '0')}`;
}

function hash(content: string | Buffer): string {
  return createHash('sha256').update(content).digest('hex');
}
