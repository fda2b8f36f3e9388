'use client';

import { useState } from 'react';
import {
  COVER_KINDS,
  DEVICE_KINDS,
  DEVICE_MARKS,
  DO_NOT_TRIP_REASONS,
  SLOT_PATTERNS,
  type DeviceMark,
} from '@/lib/findings/vocabulary';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Walk } from '@/lib/walk/use-walk';
import { COVER_LABELS, DEVICE_LABELS, DO_NOT_TRIP_LABELS, MARK_LABELS } from './labels';
import { PhysicalSigns } from './physical-signs';
import { addressOf, goTo } from './walk-address';
import { Choices, WalkButton } from './walk-button';

type Patch = Partial<Omit<WalkReceptacle, 'id' | 'revisions' | 'version' | 'deleted'>>;

/** What the thing is, apart from what it read: pattern, device, marks, cover, circuit, distances. */
export function DeviceScreen({
  walk,
  state,
  receptacle,
}: {
  walk: Walk;
  state: WalkState;
  receptacle: WalkReceptacle;
}) {
  function set(patch: Patch) {
    const base = Object.fromEntries(Object.keys(patch).map((field) => [field, receptacle.revisions[field] ?? 0]));
    void walk.save([{ op: 'receptacle.set', id: receptacle.id, patch, base }]);
  }
  const toggleMark = (mark: DeviceMark) => {
    const marks = receptacle.marks.includes(mark)
      ? receptacle.marks.filter((other) => other !== mark)
      : [...receptacle.marks, mark];
    set({ marks, marksChecked: true });
  };
  async function remove() {
    await walk.save([{ op: 'receptacle.remove', id: receptacle.id, base: receptacle.revisions }]);
    goTo(state.inspection.id, { kind: 'area', areaId: receptacle.areaId });
  }
  const area = state.areas.find((row) => row.id === receptacle.areaId);

  return (
    <div className="grid gap-6 px-4 py-4">
      <TextField
        label="Where in the area"
        value={receptacle.label}
        onSave={(label) => set({ label })}
        hint="Such as: right of basin"
      />
      <Choices
        legend="Pattern"
        columns={3}
        options={SLOT_PATTERNS.map((pattern) => [pattern, pattern] as const)}
        value={receptacle.pattern}
        onChange={(pattern) => pattern && set({ pattern })}
      />
      <Choices
        legend="Device"
        options={DEVICE_KINDS.map((kind) => [kind, DEVICE_LABELS[kind]] as const)}
        value={receptacle.device}
        onChange={(device) => device && set({ device })}
      />
      <fieldset className="grid gap-2">
        <legend className="mb-2 font-bold">Marks on the device or its plate</legend>
        <div className="grid grid-cols-2 gap-2">
          {DEVICE_MARKS.map((mark) => (
            <WalkButton
              key={mark}
              weight={receptacle.marks.includes(mark) ? 'solid' : 'outline'}
              aria-pressed={receptacle.marks.includes(mark)}
              onClick={() => toggleMark(mark)}
            >
              {MARK_LABELS[mark]}
            </WalkButton>
          ))}
        </div>
        <WalkButton
          weight={receptacle.marksChecked && receptacle.marks.length === 0 ? 'solid' : 'outline'}
          aria-pressed={receptacle.marksChecked && receptacle.marks.length === 0}
          onClick={() => set({ marks: [], marksChecked: true })}
        >
          Looked, no marks
        </WalkButton>
      </fieldset>
      <Choices
        legend="Cover"
        options={COVER_KINDS.map((cover) => [cover, COVER_LABELS[cover]] as const)}
        value={receptacle.cover ?? undefined}
        onChange={(cover) => set({ cover: cover ?? null })}
      />
      <CircuitChoice
        walk={walk}
        state={state}
        value={receptacle.circuitId}
        onChange={(circuitId) => set({ circuitId })}
      />
      <Choices
        legend="Do not trip, because of"
        options={DO_NOT_TRIP_REASONS.map((reason) => [reason, DO_NOT_TRIP_LABELS[reason]] as const)}
        value={receptacle.doNotTrip ?? undefined}
        onChange={(doNotTrip) => set({ doNotTrip: doNotTrip ?? null })}
      />
      <Distances
        receptacle={receptacle}
        outdoors={area?.place === 'outdoors' || area?.place === 'pool-area'}
        onSave={set}
      />
      <a
        className="flex min-h-[56px] items-center justify-center rounded-[2px] border-(length:--line-2) border-ink px-4 font-bold"
        href={addressOf(state.inspection.id, { kind: 'photos', receptacleId: receptacle.id })}
      >
        Photos of this receptacle
      </a>
      <PhysicalSigns walk={walk} state={state} receptacle={receptacle} />
      <WalkButton weight="quiet" onClick={() => void remove()}>
        Remove this receptacle from the list
      </WalkButton>
      <a
        className="flex min-h-[72px] items-center justify-center rounded-[2px] bg-inverse px-4 text-l font-bold text-on-inverse"
        href={addressOf(state.inspection.id, { kind: 'area', areaId: receptacle.areaId, receptacleId: receptacle.id })}
      >
        Back to the lamps
      </a>
    </div>
  );
}

function TextField({
  label,
  value,
  hint,
  onSave,
}: {
  label: string;
  value: string;
  hint?: string;
  onSave: (value: string) => void;
}) {
  const [text, setText] = useState(value);
  return (
    <label className="grid gap-2 font-bold">
      {label}
      <input
        className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
        value={text}
        maxLength={80}
        onChange={(event) => setText(event.target.value)}
        onBlur={() => {
          if (text.trim() !== value) onSave(text.trim());
        }}
      />
      {hint && <span className="text-s font-normal text-ink-2">{hint}</span>}
    </label>
  );
}

function CircuitChoice({
  state,
  value,
  onChange,
}: {
  walk: Walk;
  state: WalkState;
  value: string | null;
  onChange: (circuitId: string | null) => void;
}) {
  const circuits = state.circuits.filter((row) => !row.deleted);
  if (circuits.length === 0) return null;
  const panelName = (panelId: string) => state.panels.find((panel) => panel.id === panelId)?.name ?? 'Panel';
  return (
    <label className="grid gap-2 font-bold">
      Circuit
      <select
        className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
        value={value ?? ''}
        onChange={(event) => onChange(event.target.value || null)}
      >
        <option value="">Not traced</option>
        {circuits.map((circuit) => (
          <option key={circuit.id} value={circuit.id}>
            {panelName(circuit.panelId)}, breaker {circuit.breaker}
            {circuit.labelAsFound ? `, “${circuit.labelAsFound}”` : ''}
          </option>
        ))}
      </select>
    </label>
  );
}

type DistanceField = 'heightFt' | 'sinkFt' | 'tubOrShowerFt' | 'poolFt';

function Distances({
  receptacle,
  outdoors,
  onSave,
}: {
  receptacle: WalkReceptacle;
  outdoors: boolean;
  onSave: (patch: Patch) => void;
}) {
  return (
    <fieldset className="grid gap-3">
      <legend className="mb-2 font-bold">Distances in feet, where they matter</legend>
      <FeetField label="To the nearest sink" field="sinkFt" receptacle={receptacle} onSave={onSave} />
      <Choices
        legend="Sink measured to"
        options={[
          ['outside-edge', 'Its outside edge'],
          ['inside-bowl-edge', 'Inside edge of the bowl'],
        ]}
        value={receptacle.measuredTo ?? undefined}
        onChange={(measuredTo) => onSave({ measuredTo: measuredTo ?? null })}
      />
      <FeetField label="To the nearest tub or shower" field="tubOrShowerFt" receptacle={receptacle} onSave={onSave} />
      {outdoors && <FeetField label="To the pool" field="poolFt" receptacle={receptacle} onSave={onSave} />}
      <FeetField label="Height above the floor or ground" field="heightFt" receptacle={receptacle} onSave={onSave} />
      <div className="grid grid-cols-2 gap-2">
        <WalkButton
          weight={receptacle.noSinkNear ? 'solid' : 'outline'}
          aria-pressed={receptacle.noSinkNear}
          onClick={() => onSave({ noSinkNear: !receptacle.noSinkNear })}
        >
          No sink near
        </WalkButton>
        <WalkButton
          weight={receptacle.noTubNear ? 'solid' : 'outline'}
          aria-pressed={receptacle.noTubNear}
          onClick={() => onSave({ noTubNear: !receptacle.noTubNear })}
        >
          No tub or shower near
        </WalkButton>
      </div>
    </fieldset>
  );
}

function FeetField({
  label,
  field,
  receptacle,
  onSave,
}: {
  label: string;
  field: DistanceField;
  receptacle: WalkReceptacle;
  onSave: (patch: Patch) => void;
}) {
  const [text, setText] = useState(receptacle[field]?.toString() ?? '');
  const [problem, setProblem] = useState('');
  function save() {
    const feet = text.trim() === '' ? null : Number(text);
    const wrong = feet !== null && !(feet >= 0 && feet <= 200);
    setProblem(wrong ? 'Enter feet from 0 to 200, such as 5.5' : '');
    if (!wrong && feet !== receptacle[field]) onSave({ [field]: feet });
  }
  return (
    <label className="grid grid-cols-[1fr_7rem] items-center gap-2">
      {label}
      <input
        inputMode="decimal"
        className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 text-right"
        value={text}
        aria-invalid={problem !== ''}
        onChange={(event) => setText(event.target.value)}
        onBlur={save}
      />
      <span role="alert" className="col-span-2 font-bold empty:hidden">
        {problem && `▲ ${problem}`}
      </span>
    </label>
  );
}
