/**
 * Code points that every cut of the shipped fonts can print, as hexadecimal ranges. Made from the fonts themselves;
 * tests/pdf/letters.test.ts compares them again.
 */
const RANGES = [
  '20-7e a0-148 14a-183 186-18c 18e-194 196-1a1 1a4-1a6 1a9 1ac-1b9 1c0-1f5 1f8-220 222-223 226-233',
  '237 23a-23e 241-251 253-254 256-259 25b-25c 260 263-266 268-26c 26f 271-272 274-275 27d-27e 280 283',
  '287-28c 28e 292 294-295 298 29d 2b0 2b7-2c1 2c6-2cc 2d7 2da 2dc-2dd 2ec 2ee 2fb-2fc 300-301 303-304',
  '308-309 323 329 1d05 1d3a 1d43 1d49 1d4b 1d4d 1d52-1d53 1d58 1d5b 1d7b 1d7d-1d7e 1d91 1da4 1db6',
  '1dbb 1dbf 1e00-1e9b 1e9e 1ea0-1ef9 2002 2009 200b 2013-2014 2018-201a 201c-201e 2020 2022 2026',
  '2032-2033 2039-203a 2044 20a1-20ae 20b1-20b2 20b4-20b5 20b8-20ba 20bc-20bf 2113 2122 2191 2193 2212',
  '2215 2c60-2c66 2c6d-2c6f 2c72-2c73 a726-a727 a740-a741 a789-a78d a792-a793 a7a8-a7ab a7ad-a7ae',
  'a7b2-a7b9 a7c7-a7c8 a7cb-a7cd',
].join(' ');

const PRINTABLE = RANGES.split(' ').map((range) => {
  const [first = 0, last = first] = range.split('-').map((point) => Number.parseInt(point, 16));
  return { first, last };
});

/** The letters of a text that the fonts lack, each once, in the order of the text. They would print as something else. */
export function unprintableLetters(text: string): string[] {
  return [...new Set(text)].filter((letter) => !isPrintable(letter.codePointAt(0) ?? 0));
}

/** Line breaks are set, not printed. */
function isPrintable(point: number): boolean {
  return point === 10 || point === 13 || PRINTABLE.some(({ first, last }) => point >= first && point <= last);
}
