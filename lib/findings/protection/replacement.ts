import type { PlaceKind } from '../vocabulary';
import { protectionAsked, type Asked } from './asked';

export type ReplacementChoice = { choice: string; marks: string[]; section: string };
type Replaced = { groundPresent: boolean; place: PlaceKind; edition: number };

const NO_GROUND = 'No Equipment Ground';
const PROTECTED = 'GFCI Protected';
const TAMPER_RESISTANT = 'TR';
const WEATHER_RESISTANT = 'WR';

/** gf35: permission to put a GFCI where there is no ground. */
const GFCI_PERMITTED_EDITION = 1984;
/** gf36: duty to protect where the place now asks for it; another list says 1984. */
const GFCI_DUTY_EDITION = 1993;
/** First appearance of 406.4(D)(4), (5) and (6): arc protection, TR, WR. */
const FURTHER_DUTIES_EDITION = 2011;
const MARK_ON_PLATE_EDITION = 2017;

/**
 * What an electrician may put in place of a receptacle, by whether the box has an equipment ground, the place and the
 * edition; each with the marks that it needs and the section that the idea comes from. The better repair, a ground, is
 * always named first. Never throws. Source: NEC 406.4(D), published; 250.130(C) from memory.
 */
export function replacementChoices(p: Replaced): ReplacementChoice[] {
  const asked = protectionAsked({ place: p.place, edition: p.edition });
  const duty = p.edition >= GFCI_DUTY_EDITION ? asked.gfci.asked : 'no';
  const { words, marks } = furtherDuties(p.edition, asked);
  const grounded: ReplacementChoice = p.groundPresent
    ? {
        choice: `A three-slot receptacle joined to the ground that is there${protection(duty)}${words}`,
        marks,
        section: '406.4(D)(1)',
      }
    : {
        choice: `Run an equipment ground, then a three-slot receptacle joined to it${protection(duty)}${words}`,
        marks,
        section: '250.130(C)',
      };
  if (p.groundPresent) return [grounded];
  return [grounded, twoSlot(duty, words, marks), ...withGfci(p.edition, words, marks)];
}

function protection(duty: Asked['asked']): string {
  if (duty === 'yes') return ', with GFCI protection';
  return duty === 'depends' ? ', with GFCI protection where the place asks for it' : '';
}

/** TR is not asked of a two-slot receptacle that replaces one. */
function twoSlot(duty: Asked['asked'], words: string, marks: string[]): ReplacementChoice {
  const condition = {
    yes: ', only with GFCI protection ahead of it',
    depends: ', and where the place asks for it only with GFCI protection ahead of it',
    no: '',
  }[duty];
  return {
    choice: `A two-slot receptacle again${condition}${words}`,
    marks: marks.filter((mark) => mark !== TAMPER_RESISTANT),
    section: '406.4(D)(2)(a)',
  };
}

function withGfci(edition: number, words: string, marks: string[]): ReplacementChoice[] {
  if (edition < GFCI_PERMITTED_EDITION) return [];
  const where = edition >= MARK_ON_PLATE_EDITION ? 'marked on the device or its cover plate' : 'marked on the device';
  return [
    {
      choice: `A GFCI receptacle without a ground, ${where}; no ground wire from it to other receptacles${words}`,
      marks: [NO_GROUND, ...marks],
      section: '406.4(D)(2)(b)',
    },
    {
      choice: `A three-slot receptacle without a ground, fed by a GFCI, ${where}; no ground wire between such receptacles, and the circuit is not extended on this permission${words}`,
      marks: [PROTECTED, NO_GROUND, ...marks],
      section: '406.4(D)(2)(c)',
    },
  ];
}

function furtherDuties(
  edition: number,
  { afci, tamperResistant, weatherResistant }: ReturnType<typeof protectionAsked>,
): { words: string; marks: string[] } {
  if (edition < FURTHER_DUTIES_EDITION) return { words: '', marks: [] };
  const where = afci.asked === 'depends' ? ' where the place asks for it' : '';
  // The duty to add arc protection at a replacement took effect on 1 January 2014.
  const arc = afci.asked === 'no' ? '' : `; AFCI protection${where} since 1 January 2014, 406.4(D)(4)`;
  return {
    words: `${arc}; any GFCI or AFCI device readily reached`,
    marks: [
      ...(tamperResistant.asked === 'yes' ? [TAMPER_RESISTANT] : []),
      ...(weatherResistant.asked === 'yes' ? [WEATHER_RESISTANT] : []),
    ],
  };
}
