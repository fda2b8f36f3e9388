'use client';

import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Walk } from '@/lib/walk/use-walk';
import { placeOf } from './progress';
import { goTo } from './walk-address';
import { Choices, WalkButton } from './walk-button';

const PEOPLE = [
  ['Occupant', 'Occupant'],
  ['Buyer', 'Buyer'],
  ['Agent', 'Agent'],
  ['Owner', 'Owner'],
] as const;

/** A dangerous point is told to a person at once: whom, when, and what was left off. */
export function ToldScreen({
  walk,
  state,
  receptacle,
  title,
}: {
  walk: Walk;
  state: WalkState;
  receptacle: WalkReceptacle;
  title: string;
}) {
  const [who, setWho] = useState<(typeof PEOPLE)[number][0]>();
  const [name, setName] = useState('');
  const [left, setLeft] = useState('');
  const [missing, setMissing] = useState(false);
  const whom = [who, name.trim()].filter(Boolean).join(', ');

  async function record() {
    setMissing(whom === '');
    if (whom === '') return;
    await walk.save([
      {
        op: 'notice.add',
        id: uuidv7(),
        kind: 'danger-told',
        receptacleId: receptacle.id,
        whom,
        ...(left.trim() ? { note: left.trim() } : {}),
      },
    ]);
    goTo(state.inspection.id, { kind: 'area', areaId: receptacle.areaId });
  }

  return (
    <div className="flex grow flex-col justify-between gap-5 px-4 py-4">
      <div className="grid gap-5">
        <section>
          <h2 className="font-serif text-xl font-bold">{title}</h2>
          <p className="font-serif">
            Stop using it now. Say so to a person before you leave, and leave it off where you can do that without
            opening anything.
          </p>
        </section>
        <Choices legend="Who was told?" options={PEOPLE} value={who} onChange={setWho} />
        <LabeledInput label="Name" value={name} onChange={setName} />
        <LabeledInput
          label="What was left off"
          value={left}
          onChange={setLeft}
          hint="Such as: breaker 9 off and taped"
        />
        <p role="alert" className="font-bold empty:hidden">
          {missing && '▲ Choose who was told, or write a name.'}
        </p>
        <section aria-label="Text for a tag" className="border-2 border-dashed border-ink p-3">
          <p>
            <b>DO NOT USE.</b> {placeOf(state, receptacle.id)}. Found{' '}
            {new Date().toLocaleDateString('en-US', { dateStyle: 'medium' })}. {left.trim() && `${left.trim()}. `}A
            licensed electrician must repair it first.
          </p>
        </section>
        <WalkButton weight="quiet" onClick={() => window.print()}>
          Print the tag
        </WalkButton>
      </div>
      <WalkButton
        weight="log"
        records={whom ? `Records the time and ${whom}` : 'Records the time and whom'}
        onClick={() => void record()}
      >
        Told
      </WalkButton>
    </div>
  );
}

function LabeledInput({
  label,
  value,
  hint,
  onChange,
}: {
  label: string;
  value: string;
  hint?: string;
  onChange: (value: string) => void;
}) {
  return (
    <label className="grid gap-1 font-bold">
      {label}
      <input
        className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
        maxLength={120}
        value={value}
        onChange={(event) => onChange(event.target.value)}
      />
      {hint && <span className="text-s font-normal text-ink-2">{hint}</span>}
    </label>
  );
}
