import type { PlaceKind } from '../vocabulary';
import { protectionAsked } from './asked';

export type ReplacementChoice = { choice: string; marks: string[]; section: string };

const NO_GROUND = 'No Equipment Ground';
const PROTECTED = 'GFCI Protected';

/**
 * What an electrician may put in place of a receptacle, by whether the box has an equipment ground, the place and the
 * edition; each with the marks that it needs and the section that the idea comes from. The better repair, a ground, is
 * always named. Never throws. Source: NEC 406.4(D); 250.130(C) from memory.
 */
export function replacementChoices(p: {
  groundPresent: boolean;
  place: PlaceKind;
  edition: number;
}): ReplacementChoice[] {
  const asked = protectionAsked({ place: p.place, edition: p.edition });
  const extras = extraDuties(p, asked);
  if (p.groundPresent) {
    const gfci =
      asked.gfci.asked === 'no' || p.edition < 1993 ? '' : ', with GFCI protection where the place asks for it';
    return [
      {
        choice: `A three-slot receptacle joined to the ground that is there${gfci}${extras.words}`,
        marks: extras.marks,
        section: '406.4(D)(1)',
      },
    ];
  }
  const choices: ReplacementChoice[] = [
    {
      choice: `Run an equipment ground, then a three-slot receptacle joined to it${extras.words}`,
      marks: extras.marks,
      section: '250.130(C)',
    },
  ];
  const twoSlotNeedsGfci = asked.gfci.asked !== 'no' && p.edition >= 1993;
  choices.push({
    choice: twoSlotNeedsGfci
      ? 'A two-slot receptacle again, only with GFCI protection ahead of it'
      : 'A two-slot receptacle again',
    marks: [],
    section: '406.4(D)(2)(a)',
  });
  if (p.edition >= 1984) {
    choices.push({
      choice: `A GFCI receptacle without a ground${extras.words}`,
      marks: [NO_GROUND, ...extras.marks],
      section: '406.4(D)(2)(b)',
    });
    choices.push({
      choice: `A three-slot receptacle without a ground, fed by a GFCI; no ground wire between such receptacles, and the circuit is not extended${extras.words}`,
      marks: [PROTECTED, NO_GROUND, ...extras.marks],
      section: '406.4(D)(2)(c)',
    });
  }
  return choices;
}

function extraDuties(
  { edition }: { edition: number },
  asked: ReturnType<typeof protectionAsked>,
): { words: string; marks: string[] } {
  if (edition < 2011) return { words: '', marks: [] };
  const marks = [
    ...(asked.tamperResistant.asked === 'yes' ? ['TR'] : []),
    ...(asked.weatherResistant.asked === 'yes' ? ['WR'] : []),
  ];
  // The duty to add arc protection at a replacement took effect on 1 January 2014.
  const arc = asked.afci.asked === 'no' ? '' : '; AFCI protection where the place asks for it, 406.4(D)(4)';
  return { words: arc, marks };
}
