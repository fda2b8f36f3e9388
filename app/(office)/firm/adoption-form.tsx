'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedSelect, PostedText } from '@/components/ui/posted-field';
import { NEC_EDITIONS } from '@/lib/findings/vocabulary';
import { addAdoptionAction, type AdoptionState } from './actions';

const EMPTY: AdoptionState = { values: { place: '', edition: '', from: '', source: '' }, problems: [] };
const EDITIONS = [
  ['', 'Choose an edition'] as const,
  ...NEC_EDITIONS.toReversed().map((year) => [String(year), String(year)] as const),
];

export function AdoptionForm() {
  const [{ values, problems }, submit, isSending] = useActionState(addAdoptionAction, EMPTY);
  return (
    <form action={submit} noValidate className="grid gap-4" aria-label="Add an edition">
      <ErrorSummary problems={problems} />
      <PostedText label="Town, county or state" name="place" defaultValue={values.place} problems={problems} />
      <div className="grid gap-4 sm:grid-cols-2">
        <PostedSelect
          label="Edition"
          name="edition"
          defaultValue={values.edition}
          options={EDITIONS}
          problems={problems}
        />
        <PostedText label="In force from" name="from" type="date" defaultValue={values.from} problems={problems} />
      </div>
      <PostedText
        label="Where this comes from"
        name="source"
        defaultValue={values.source}
        hint="The ordinance, or who told you and when"
        problems={problems}
      />
      <p>
        <Button type="submit" pending={isSending}>
          Add the edition
        </Button>
      </p>
    </form>
  );
}
