'use client';

import { useState } from 'react';
import type { Protects, TripResult } from '@/lib/findings/vocabulary';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Walk } from '@/lib/walk/use-walk';

export type TrialProps = { walk: Walk; state: WalkState; receptacle: WalkReceptacle };

export const TRIPS: [TripResult, string][] = [
  ['trips', 'It trips'],
  ['no-trip', 'It does not trip'],
];
export const YES_NO: ['yes' | 'no', string][] = [
  ['yes', 'Yes'],
  ['no', 'No'],
];

export function shown(value: boolean | undefined): 'yes' | 'no' | undefined {
  if (value === undefined) return undefined;
  return value ? 'yes' : 'no';
}

export function answered(value: 'yes' | 'no' | undefined): boolean | undefined {
  return value === undefined ? undefined : value === 'yes';
}

/** A cleared answer is absent, not empty: the schema refuses keys without a value. */
export function withoutGaps<Evidence extends object>(evidence: Evidence): Evidence {
  return Object.fromEntries(Object.entries(evidence).filter(([, value]) => value !== undefined)) as Evidence;
}

const PROTECTS: Record<Protects, string> = {
  yes: 'Protection shown',
  no: 'No protection shown',
  unproven: 'Protection unproven',
};

export function Verdict({ says, protects }: { says: string; protects: Protects }) {
  return (
    <section aria-live="polite" className="border-y-2 border-ink py-3">
      <h2 className="font-serif text-l font-bold">{PROTECTS[protects]}</h2>
      <p>{says}</p>
    </section>
  );
}

export function NotTested({ value, onChange }: { value?: string; onChange: (reason: string | undefined) => void }) {
  const [text, setText] = useState(value ?? '');
  return (
    <label className="grid gap-2 font-bold">
      Not tested, because
      <input
        className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
        value={text}
        onChange={(event) => setText(event.target.value)}
        onBlur={() => {
          if (text.trim() !== (value ?? '')) onChange(text.trim() || undefined);
        }}
      />
    </label>
  );
}
