import { createRequire } from 'node:module';
import { expect, test } from 'vitest';
import { FONT_FAMILIES, fontFile } from '@/components/report/report-fonts';
import { unprintableLetters } from '@/lib/schemas/printable-letters';

const { openSync } = createRequire(import.meta.url)('fontkit') as {
  openSync: (file: string) => { characterSet: number[] };
};
const CUTS = [
  [400, 'normal'],
  [400, 'italic'],
  [700, 'normal'],
] as const;
/** Asked for by a few fonts without being letters: control codes, the byte order mark, a non-character. */
const isLetter = (point: number) => point >= 32 && point !== 0xfeff && point !== 0xffff;

test('a letter counts as printable exactly where every cut of the shipped fonts has it', () => {
  const sets = CUTS.map(
    ([weight, style]) =>
      new Set(
        FONT_FAMILIES.flatMap(({ name, script }) => openSync(fontFile(name, script, weight, style)).characterSet),
      ),
  );
  const candidates = [...new Set(sets.flatMap((set) => [...set]))].filter(isLetter);
  const wrong = candidates.filter((point) => {
    const inAll = sets.every((set) => set.has(point));
    return inAll === unprintableLetters(String.fromCodePoint(point)).length > 0;
  });
  expect(wrong.map((point) => point.toString(16))).toEqual([]);
});

test('names of many countries print, and letters of other scripts are named', () => {
  for (const name of [
    'Nguyễn Thị Hằng',
    'Łódź',
    'Şahin',
    'Peñalver',
    'Žižek',
    'Ångström',
    'Bjørn',
    'Ødegård',
    'Façade',
  ])
    expect(unprintableLetters(name)).toEqual([]);
  expect(unprintableLetters('Анна Smith 李')).toEqual(['А', 'н', 'а', '李']);
});
