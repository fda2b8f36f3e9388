'use client';

import { useActionState } from 'react';
import { WIRING_METHOD_LABELS } from '@/components/walk/labels';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedSelect, PostedText } from '@/components/ui/posted-field';
import { NEC_EDITIONS, SUPPLIES, WIRING_METHODS } from '@/lib/findings/vocabulary';
import type { WalkState } from '@/lib/schemas/walk';
import { saveHouseAction, type HouseState } from './actions';

type HouseFacts = WalkState['inspection'];
const YES_NO = [
  ['', 'Not known'],
  ['yes', 'Yes'],
  ['no', 'No'],
] as const;
const EDITIONS = [
  ['', 'Nobody could say'] as const,
  ...NEC_EDITIONS.toReversed().map((year) => [String(year), String(year)] as const),
];

/** What is known of the house. A value that somebody else changed meanwhile is not overwritten; both are shown. */
export function HouseForm({
  inspectionId,
  facts,
  revisions,
}: {
  inspectionId: string;
  facts: HouseFacts;
  revisions: Record<string, number>;
}) {
  const start: HouseState = {
    problems: [],
    saved: false,
    values: {
      yearBuilt: facts.yearBuilt?.toString() ?? '',
      wiringMethod: facts.wiringMethod,
      supply: facts.supply,
      serviceAmps: facts.serviceAmps?.toString() ?? '',
      occupied: yesNo(facts.occupied),
      utilitiesOn: yesNo(facts.utilitiesOn),
      codeEdition: facts.codeEdition?.toString() ?? '',
      codeEditionSource: facts.codeEditionSource ?? '',
    },
  };
  const [{ values, problems, saved }, submit, isSending] = useActionState(
    saveHouseAction.bind(null, inspectionId, revisions),
    start,
  );
  return (
    <form action={submit} noValidate className="mt-4 grid gap-4">
      <ErrorSummary problems={problems} />
      <div className="grid gap-4 sm:grid-cols-2">
        <PostedText
          label="Year built"
          name="yearBuilt"
          inputMode="numeric"
          defaultValue={values.yearBuilt}
          problems={problems}
        />
        <PostedSelect
          label="Wiring method"
          name="wiringMethod"
          defaultValue={values.wiringMethod}
          options={WIRING_METHODS.map((method) => [method, WIRING_METHOD_LABELS[method]] as const)}
          problems={problems}
        />
        <PostedSelect
          label="Service voltage"
          name="supply"
          defaultValue={values.supply}
          options={SUPPLIES.map((supply) => [supply, `${supply} V`] as const)}
          problems={problems}
        />
        <PostedText
          label="Service, amperes"
          name="serviceAmps"
          inputMode="numeric"
          defaultValue={values.serviceAmps}
          problems={problems}
        />
        <PostedSelect
          label="Occupied"
          name="occupied"
          defaultValue={values.occupied}
          options={YES_NO}
          problems={problems}
        />
        <PostedSelect
          label="Power on"
          name="utilitiesOn"
          defaultValue={values.utilitiesOn}
          options={YES_NO}
          problems={problems}
        />
        <PostedSelect
          label="Edition of the model code taken for this house"
          name="codeEdition"
          defaultValue={values.codeEdition}
          options={EDITIONS}
          problems={problems}
        />
        <PostedText
          label="Where the edition comes from"
          name="codeEditionSource"
          hint="Who said so, or what it is taken from"
          defaultValue={values.codeEditionSource}
          problems={problems}
        />
      </div>
      <p className="flex items-center gap-4">
        <Button type="submit" pending={isSending}>
          Save the house
        </Button>
        <span role="status">{saved && 'Saved.'}</span>
      </p>
    </form>
  );
}

function yesNo(value: boolean | null): string {
  if (value === null) return '';
  return value ? 'yes' : 'no';
}
