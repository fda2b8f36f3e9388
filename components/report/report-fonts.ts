import { createRequire } from 'node:module';
import path from 'node:path';
import { Font } from '@react-pdf/renderer';

type Cut = { weight: 400 | 700; style: 'normal' | 'italic' };
const CUTS: Cut[] = [
  { weight: 400, style: 'normal' },
  { weight: 400, style: 'italic' },
  { weight: 700, style: 'normal' },
];

/** One family per script: a text falls through the list of its style until a font has the letter. */
export const FONT_FAMILIES = [
  { family: 'Merriweather', name: 'merriweather', script: 'latin' },
  { family: 'Merriweather ext', name: 'merriweather', script: 'latin-ext' },
  { family: 'Merriweather vietnamese', name: 'merriweather', script: 'vietnamese' },
  { family: 'Atkinson Hyperlegible', name: 'atkinson-hyperlegible', script: 'latin' },
  { family: 'Atkinson Hyperlegible ext', name: 'atkinson-hyperlegible', script: 'latin-ext' },
] as const;

let isRegistered = false;

/** The shipped fonts, from this installation's own packages. */
export function registerFonts(): void {
  if (isRegistered) return;
  isRegistered = true;
  for (const { family, name, script } of FONT_FAMILIES)
    Font.register({
      family,
      fonts: CUTS.map(({ weight, style }) => ({
        src: fontFile(name, script, weight, style),
        fontWeight: weight,
        fontStyle: style,
      })),
    });
  Font.registerHyphenationCallback((word) => [word]);
}

export function fontFile(name: string, script: string, weight: 400 | 700, style: 'normal' | 'italic'): string {
  const packageFile = createRequire(import.meta.url).resolve(`@fontsource/${name}/package.json`);
  return path.join(path.dirname(packageFile), 'files', `${name}-${script}-${weight}-${style}.woff`);
}
