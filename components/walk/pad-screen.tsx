'use client';

import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import type { LampPattern } from '@/lib/findings/facts';
import { SKIP_REASONS, type Lamp, type SkipReason, type SlotPattern } from '@/lib/findings/vocabulary';
import type { WalkArea, WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Draft, Walk } from '@/lib/walk/use-walk';
import { LampPad, type TappedLamps } from './lamp-pad';
import { lampsInWords, showsNoFault, SKIP_LABELS } from './labels';
import { PhotoButton } from './photo-button';
import { photosOf } from './photos-screen';
import { receptacleName, receptaclesOf, skipOf, standingReadings } from './progress';
import { ReceptacleStrip } from './receptacle-strip';
import { addressOf, goOn } from './walk-address';
import { WalkButton } from './walk-button';

const CORRECT: LampPattern = { hn: 'lit', hg: 'lit', ng: 'off' };
const ALL_OFF: LampPattern = { hn: 'off', hg: 'off', ng: 'off' };

type Logged = { words: string; undo: Draft[] };

/** One receptacle after another: one tap logs a correct one and moves on. Nothing is preset. */
export function PadScreen({
  walk,
  state,
  area,
  receptacleId,
  off,
}: {
  walk: Walk;
  state: WalkState;
  area: WalkArea;
  receptacleId?: string;
  off: Set<string>;
}) {
  const rows = receptaclesOf(state, area.id);
  const current = rows.find((row) => row.id === receptacleId) ?? firstUntested(state, rows);
  const [tapped, setTapped] = useState<{ on?: string; lamps: TappedLamps }>({ lamps: {} });
  const [skipping, setSkipping] = useState(false);
  const [logged, setLogged] = useState<Logged | null>(null);
  // Lamps tapped for one receptacle never stand for the next.
  const lamps = tapped.on === current?.id ? tapped.lamps : {};
  const setLamps = (next: TappedLamps) => setTapped({ on: current?.id, lamps: next });
  const inspectionId = state.inspection.id;
  const name = current ? receptacleName(state, current) : `Receptacle ${rows.length + 1}`;
  const slots = current?.pattern ?? '5-15R';
  const twoSlot = slots === '1-15R';
  const untouched = Object.values(lamps).every((lamp) => lamp === undefined);

  async function log(pattern: LampPattern) {
    const from = window.location.hash;
    const { id, drafts } = ensureReceptacle(state, area, rows, current);
    const readingId = uuidv7();
    const earlier =
      current && standingReadings(state, current.id).findLast((row) => row.kind === 'wiring' && row.evidence.lamps);
    await walk.save([...drafts, wiringReading(state, readingId, id, pattern, earlier?.id)]);
    navigator.vibrate?.(30);
    setLamps({});
    setLogged({
      words: `${name}, ${loggedWords(pattern, slots)}`,
      undo: undoOf(readingId, id, drafts),
    });
    if (showsNoFault(pattern, slots)) goOn(from, inspectionId, { kind: 'area', areaId: area.id });
    else goOn(from, inspectionId, { kind: 'result', receptacleId: id });
  }

  async function skip(reason: SkipReason) {
    const from = window.location.hash;
    const { id, drafts } = ensureReceptacle(state, area, rows, current);
    const skipId = uuidv7();
    await walk.save([...drafts, { op: 'skip.add', id: skipId, receptacleId: id, reason }]);
    setSkipping(false);
    setLogged({ words: `${name}, skipped`, undo: [{ op: 'skip.remove', id: skipId, base: {} }] });
    goOn(from, inspectionId, { kind: 'area', areaId: area.id });
  }

  async function photoSubject() {
    const { id, drafts } = ensureReceptacle(state, area, rows, current);
    if (drafts.length > 0) await walk.save(drafts);
    return { receptacleId: id };
  }

  async function undo() {
    if (!logged) return;
    await walk.save(logged.undo);
    setLogged(null);
  }

  if (skipping) return <SkipChoice name={name} onChoose={skip} onBack={() => setSkipping(false)} />;
  const pattern = wholePattern(lamps, twoSlot);
  return (
    <div className="flex grow flex-col">
      <ReceptacleStrip state={state} rows={rows} currentId={current?.id} off={off} />
      <div className="grid grow content-between gap-4 px-4 pb-4">
        <div>
          <div className="flex items-baseline justify-between gap-4 py-2">
            <h2 className="font-serif text-l font-bold">{name}</h2>
            {current && (
              <a
                className="flex min-h-[44px] items-center underline underline-offset-4"
                href={addressOf(inspectionId, { kind: 'device', receptacleId: current.id })}
              >
                {current.device === 'receptacle' ? current.pattern : 'Device'}
              </a>
            )}
          </div>
          <LampPad pattern={slots} lamps={lamps} onChange={setLamps} />
        </div>
        <div className="grid gap-2">
          <div className="grid grid-cols-3 gap-2">
            {untouched ? (
              <WalkButton onClick={() => void log(twoSlot ? { ...ALL_OFF } : ALL_OFF)}>
                All {twoSlot ? '' : 'three '}off
              </WalkButton>
            ) : (
              <WalkButton onClick={() => setLamps({})}>Clear</WalkButton>
            )}
            <WalkButton onClick={() => setSkipping(true)}>Skip…</WalkButton>
            <PhotoButton walk={walk} subject={photoSubject} />
          </div>
          <WalkButton
            weight="log"
            records={recordsWords(untouched ? correctOf(twoSlot) : pattern, slots, untouched)}
            onClick={() => void log(untouched ? correctOf(twoSlot) : pattern)}
          >
            {namePattern(untouched ? correctOf(twoSlot) : pattern, slots)}
          </WalkButton>
          <div className="grid grid-cols-2 gap-2">
            <TripLink inspectionId={inspectionId} current={current} />
            <PhotosLink
              inspectionId={inspectionId}
              current={current}
              count={current ? photosOf(state, current.id).length : 0}
            />
            <WalkButton weight="quiet" onClick={() => void addAnother(walk, area, rows)}>
              Add a receptacle
            </WalkButton>
          </div>
          <p
            role="status"
            className="flex min-h-[56px] items-center justify-between gap-4 border-t border-hairline text-s"
          >
            <span>{logged ? `Logged ${logged.words}` : skippedWords(state, current)}</span>
            {logged && (
              <button
                type="button"
                className="min-h-[56px] px-4 text-m underline underline-offset-4"
                onClick={() => void undo()}
              >
                Undo
              </button>
            )}
          </p>
        </div>
      </div>
    </div>
  );
}

function TripLink({ inspectionId, current }: { inspectionId: string; current?: WalkReceptacle }) {
  if (!current) return <span />;
  return (
    <a
      className="flex min-h-[56px] items-center justify-center rounded-[2px] underline underline-offset-4"
      href={addressOf(inspectionId, { kind: 'trip', receptacleId: current.id })}
    >
      Trip test
    </a>
  );
}

function PhotosLink({
  inspectionId,
  current,
  count,
}: {
  inspectionId: string;
  current?: WalkReceptacle;
  count: number;
}) {
  if (!current || count === 0) return <span />;
  return (
    <a
      className="flex min-h-[56px] items-center justify-center rounded-[2px] underline underline-offset-4"
      href={addressOf(inspectionId, { kind: 'photos', receptacleId: current.id })}
    >
      Photos: {count}
    </a>
  );
}

function firstUntested(state: WalkState, rows: WalkReceptacle[]): WalkReceptacle | undefined {
  return rows.find((row) => standingReadings(state, row.id).length === 0 && !skipOf(state, row));
}

/** The receptacle to log on: the one on screen, or a new one at the end of the area. */
function ensureReceptacle(
  state: WalkState,
  area: WalkArea,
  rows: WalkReceptacle[],
  current: WalkReceptacle | undefined,
) {
  const visit: Draft[] = state.inspection.state === 'booked' ? [{ op: 'inspection.advance', to: 'on-site' }] : [];
  if (current) return { id: current.id, drafts: visit };
  const id = uuidv7();
  const add: Draft = { op: 'receptacle.add', id, fields: { areaId: area.id, order: nextOrder(rows) } };
  return { id, drafts: [...visit, add] };
}

async function addAnother(walk: Walk, area: WalkArea, rows: WalkReceptacle[]) {
  await walk.save([{ op: 'receptacle.add', id: uuidv7(), fields: { areaId: area.id, order: nextOrder(rows) } }]);
}

function nextOrder(rows: WalkReceptacle[]): number {
  return Math.max(0, ...rows.map((row) => row.order)) + 1;
}

function wiringReading(
  state: WalkState,
  id: string,
  receptacleId: string,
  lamps: LampPattern,
  supersedes?: string,
): Draft {
  return {
    op: 'reading.add',
    id,
    visitId: state.inspection.visitId,
    receptacleId,
    supersedes,
    reading: { kind: 'wiring', evidence: { lamps } },
  };
}

function undoOf(readingId: string, receptacleId: string, drafts: Draft[]): Draft[] {
  const made = drafts.some((draft) => draft.op === 'receptacle.add');
  const withdraw: Draft = { op: 'reading.withdraw', id: readingId };
  return made ? [withdraw, { op: 'receptacle.remove', id: receptacleId, base: {} }] : [withdraw];
}

function correctOf(twoSlot: boolean): LampPattern {
  return twoSlot ? { hn: 'lit', hg: 'off', ng: 'off' } : CORRECT;
}

/** Lamps that were not tapped count as off once any was: the button says so before it records. */
function wholePattern(lamps: TappedLamps, twoSlot: boolean): LampPattern {
  const of = (lamp: Lamp | undefined) => lamp ?? 'off';
  return { hn: of(lamps.hn), hg: twoSlot ? 'off' : of(lamps.hg), ng: twoSlot ? 'off' : of(lamps.ng) };
}

function namePattern(lamps: LampPattern, slots: SlotPattern): string {
  if (slots === '1-15R') return `The lamp is ${lamps.hn}`;
  if (showsNoFault(lamps, slots)) return 'Lamps read correct';
  const lit = Object.values(lamps).filter((lamp) => lamp === 'lit').length;
  const words = lampsInWords(lamps).split(', ')[0] ?? '';
  if (lit === 1 && !Object.values(lamps).includes('dim')) return `Only ${words.replace(' lit', '')} is lit`;
  if (lit === 3) return 'All three are lit';
  return words.charAt(0).toUpperCase() + words.slice(1);
}

function recordsWords(lamps: LampPattern, slots: SlotPattern, untouched: boolean): string {
  const words = lampsInWords(lamps, slots);
  if (!showsNoFault(lamps, slots)) return `Records ${words}. Not a correct pattern.`;
  return untouched ? `${words}. Then the next one.` : `${words}.`;
}

function loggedWords(lamps: LampPattern, slots: SlotPattern): string {
  return slots !== '1-15R' && showsNoFault(lamps, slots) ? 'lamps correct' : lampsInWords(lamps, slots);
}

function skippedWords(state: WalkState, current: WalkReceptacle | undefined): string {
  const skip = current && skipOf(state, current);
  return skip ? `Skipped: ${SKIP_LABELS[skip.reason]}` : 'Nothing is recorded until you tap.';
}

function SkipChoice({
  name,
  onChoose,
  onBack,
}: {
  name: string;
  onChoose: (reason: SkipReason) => void;
  onBack: () => void;
}) {
  return (
    <div className="grid gap-2 px-4 py-4">
      <h2 className="font-serif text-l font-bold">Why was {name} not tested?</h2>
      {SKIP_REASONS.map((reason) => (
        <WalkButton key={reason} onClick={() => onChoose(reason)}>
          {SKIP_LABELS[reason]}
        </WalkButton>
      ))}
      <WalkButton weight="quiet" onClick={onBack}>
        Back to the lamps
      </WalkButton>
    </div>
  );
}
