import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { WebReport } from '@/components/report/web-report';
import { goldenSnapshot } from '../support/snapshot';

test('the web report says what the snapshot says, without script, with every photo under its own words', async () => {
  const { snapshot, sha256 } = await goldenSnapshot();
  const photoSrc = (photoId: string, size: string) => `/api/photos/${photoId}?size=${size}`;
  const html = renderToStaticMarkup(<WebReport snapshot={snapshot} sha256={sha256} photoSrc={photoSrc} />);
  const text = html.replaceAll(/<[^>]+>/g, ' ').replaceAll(/\s+/g, ' ');
  for (const { place, text: words } of snapshot.findings) {
    const { observed, means, plain, doNext, hazard, unproven } = words.en;
    for (const line of [place, observed, means, doNext, hazard.type, hazard.consequence, hazard.avoid, ...unproven])
      expect(text).toContain(line);
    if (hazard.signal === 'DANGER') expect(text).toContain(plain);
  }
  for (const line of [...snapshot.gaps, ...snapshot.notTested]) expect(text).toContain(line.says.en);
  for (const line of snapshot.limits.en) expect(text).toContain(line);
  for (const row of snapshot.log) expect(text).toContain(row.label);
  for (const photo of snapshot.photos) expect(html).toContain(`alt="${photo.caption}"`);
  expect(text.replaceAll(' ', '')).toContain(sha256);
  expect(html).not.toContain('<script');
});
