import type { WiringEvidence } from '../facts';
import { WIRING_CONDITIONS, type WiringCondition } from '../vocabulary';
import { lampsInWords, voltsInWords } from '../evidence';
import {
  groundOhmsFit,
  lampsFit,
  loadTestFits,
  loadsAreOff,
  sensorFits,
  sensorSays,
  someVariant,
  trioFits,
  triosOf,
} from './fit';
import { hypothesesFor, type Hypothesis } from './hypotheses';
import { predictedLamps, predictedVolts } from './predict';

/** One thing that is known of a receptacle, with the conditions that it leaves standing and why it excludes others. */
export type Piece = {
  kind: 'face' | 'lamps' | 'volts' | 'load-test' | 'sensor' | 'ground-ohms' | 'jumper' | 'power' | 'loads' | 'neutral';
  /** Equal keys leave the same conditions standing on the same kind of receptacle. */
  key: string;
  name: string;
  fits: (hypothesis: Hypothesis) => boolean;
  excludes: (hypothesis: Hypothesis) => string;
};

/** A jumper at this receptacle can stand beside these: they are about the hot side, or lie ahead of the receptacle. */
const BESIDE_A_JUMPER: readonly WiringCondition[] = [
  'bootleg-ground',
  'reversed-bootleg-ground',
  'bootleg-ground-open-neutral',
  'no-power',
  'open-hot',
  'high-resistance-hot',
  'service-neutral-open',
];

const GROUND_CONDITIONS: readonly WiringCondition[] = [
  'open-ground',
  'hot-ground-reversed',
  'hot-on-ground-hot-open',
  'neutral-on-hot-hot-on-ground-neutral-open',
  'neutral-ground-swapped',
  'bootleg-ground',
  'reversed-bootleg-ground',
  'open-ground-hot-neutral-reversed',
  'open-neutral-and-ground',
  'high-resistance-ground',
  'bootleg-ground-open-neutral',
  'open-ground-energized',
];

/** The evidence as separate pieces. Each only ever excludes, so more evidence never adds a candidate. */
export function piecesOf(evidence: WiringEvidence): Piece[] {
  return [
    facePiece(evidence),
    ...lampsPiece(evidence),
    ...voltPieces(evidence),
    ...loadTestPiece(evidence),
    ...sensorPiece(evidence),
    ...groundOhmsPiece(evidence),
    ...contextPieces(evidence),
  ];
}

export function hypothesesOf({ nominalVolts = 120, supply }: WiringEvidence): readonly Hypothesis[] {
  return hypothesesFor(nominalVolts, supply);
}

const MOST_KEPT = 4000;
const kept = new Map<string, ReadonlySet<Hypothesis>>();

/** The hypotheses that a piece leaves standing. Remembered: the same readings come again and again in a house. */
export function standingUnder(piece: Piece, evidence: WiringEvidence): ReadonlySet<Hypothesis> {
  const { slots, nominalVolts = 120, supply } = evidence;
  const key = `${slots} ${nominalVolts} ${supply} ${loadsAreOff(evidence)} ${piece.kind} ${piece.key}`;
  const known = kept.get(key);
  if (known) return known;
  const standing = new Set(hypothesesOf(evidence).filter((hypothesis) => piece.fits(hypothesis)));
  if (kept.size >= MOST_KEPT) kept.clear();
  kept.set(key, standing);
  return standing;
}

function facePiece({ slots, nominalVolts }: WiringEvidence): Piece {
  const noGround = (condition: WiringCondition) => slots === 2 && GROUND_CONDITIONS.includes(condition);
  return {
    kind: 'face',
    key: '',
    name: slots === 2 ? 'a two-slot face' : 'the face',
    fits: ({ condition, family }) => family.length > 0 && !noGround(condition),
    excludes: ({ condition }) => {
      if (noGround(condition)) return 'A two-slot receptacle has no ground slot.';
      return nominalVolts === 240
        ? 'A 240 volt receptacle has two hot slots and no neutral.'
        : 'The receptacle cannot have this.';
    },
  };
}

function lampsPiece(evidence: WiringEvidence): Piece[] {
  const { lamps, slots } = evidence;
  if (!lamps) return [];
  const off = loadsAreOff(evidence);
  const shown = slots === 2 ? `hot to neutral ${lamps.hn}` : lampsInWords(lamps);
  return [
    {
      kind: 'lamps',
      key: shown,
      name: `the lamps (${shown})`,
      fits: (hypothesis) => someVariant(hypothesis, off, (variant) => lampsFit(variant, lamps, slots)),
      excludes: (hypothesis) => `Lamps would show ${predictedLamps(hypothesis, off, slots)}; they showed ${shown}.`,
    },
  ];
}

function voltPieces(evidence: WiringEvidence): Piece[] {
  const off = loadsAreOff(evidence);
  const { slots } = evidence;
  return triosOf(evidence).map((trio) => {
    const shown = slots === 2 ? `${trio.meter} meter: ${trio.hn} volts between the slots` : voltsInWords(trio);
    return {
      kind: 'volts' as const,
      key: shown,
      name: `the ${shown}`,
      fits: (hypothesis: Hypothesis) => trioFits(hypothesis, trio, slots, off),
      excludes: (hypothesis: Hypothesis) =>
        `A ${trio.meter} meter would show ${predictedVolts(hypothesis, trio.meter, off, slots)}; it showed ${shown.replace(/^.*?: /, '')}.`,
    };
  });
}

function loadTestPiece(evidence: WiringEvidence): Piece[] {
  const { loadTest } = evidence;
  if (!loadTest) return [];
  const shown = `${loadTest.noLoadHn} volts without load and ${loadTest.loadedHn} volts at ${loadTest.amps} amperes`;
  return [
    {
      kind: 'load-test',
      key: shown,
      name: `the load test (${shown})`,
      fits: (hypothesis) =>
        someVariant(hypothesis, loadsAreOff(evidence), (variant) => loadTestFits(variant, loadTest)),
      excludes: () => `Under load it would not read ${shown}.`,
    },
  ];
}

function sensorPiece(evidence: WiringEvidence): Piece[] {
  const { sensor, slots } = evidence;
  if (!sensor) return [];
  return [
    {
      kind: 'sensor',
      key: Object.entries(sensorSays(sensor)).flat().join(' '),
      name: 'what the live-wire sensor answered',
      fits: (hypothesis) =>
        someVariant(hypothesis, loadsAreOff(evidence), (variant) => sensorFits(variant, sensor, slots)),
      excludes: () => 'The live-wire sensor answered where this would be quiet, or was quiet where this would be live.',
    },
  ];
}

function groundOhmsPiece(evidence: WiringEvidence): Piece[] {
  const { groundOhms, slots } = evidence;
  if (groundOhms === undefined || slots === 2) return [];
  return [
    {
      kind: 'ground-ohms',
      key: `${groundOhms}`,
      name: `the ground path of ${groundOhms} ohms`,
      fits: (hypothesis) =>
        someVariant(hypothesis, loadsAreOff(evidence), (variant) =>
          groundOhmsFit(variant, groundOhms, hypothesis.condition),
        ),
      excludes: ({ condition }) =>
        condition === 'correct'
          ? `A sound ground path reads at most about 1 ohm; ${groundOhms} ohms were read.`
          : `This leaves no ground path of ${groundOhms} ohms.`,
    },
  ];
}

function contextPieces(evidence: WiringEvidence): Piece[] {
  const { groundJumperSeen, powerChecked, sharedNeutral } = evidence;
  const pieces: Piece[] = [];
  if (groundJumperSeen)
    pieces.push({
      kind: 'jumper',
      key: '',
      name: 'the jumper that was seen from neutral to the ground slot',
      fits: ({ condition }) => BESIDE_A_JUMPER.includes(condition),
      excludes: () => 'A jumper from neutral to the ground slot was seen here.',
    });
  if (powerChecked)
    pieces.push(
      without('power', 'no-power', 'the power that was checked', 'Breaker, GFCI and wall switch were found on.'),
    );
  if (sharedNeutral === 'no')
    pieces.push(
      without('neutral', 'shared-neutral-open', 'the neutral of its own', 'The circuit has a neutral of its own.'),
    );
  if (loadsAreOff(evidence))
    pieces.push({
      kind: 'loads',
      key: '',
      name: 'the loads that were taken off',
      fits: (hypothesis) => someVariant(hypothesis, true, () => true),
      excludes: () => 'Everything was unplugged and what is wired in was off, so no load can carry this.',
    });
  return pieces;
}

function without(kind: Piece['kind'], condition: WiringCondition, name: string, because: string): Piece {
  return { kind, key: '', name, fits: (hypothesis) => hypothesis.condition !== condition, excludes: () => because };
}

/** Position in the vocabulary, so that lists never depend on the order of input. */
export function vocabularyOrder(a: WiringCondition, b: WiringCondition): number {
  return WIRING_CONDITIONS.indexOf(a) - WIRING_CONDITIONS.indexOf(b);
}
