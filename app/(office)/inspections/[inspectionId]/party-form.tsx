'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { TextField } from '@/components/ui/field';
import { savePartyAction, type PartyState } from './actions';

type PartyFormProps = {
  inspectionId: string;
  kind: 'buyer' | 'agent';
  title: string;
  party?: { id: string; name: string; email: string | null; phone: string | null };
};

export function PartyForm({ inspectionId, kind, title, party }: PartyFormProps) {
  const start: PartyState = {
    problems: [],
    saved: false,
    values: { name: party?.name ?? '', email: party?.email ?? '', phone: party?.phone ?? '' },
  };
  const [{ values, problems, saved }, submit, isSending] = useActionState(
    savePartyAction.bind(null, inspectionId, kind, party?.id ?? null),
    start,
  );
  const field = (name: keyof PartyState['values']) => ({
    id: `${kind}-${name}`,
    name,
    defaultValue: values[name],
    error: problems.find((problem) => problem.field === `${kind}-${name}`)?.says,
  });
  return (
    <form action={submit} noValidate className="grid content-start gap-3" aria-label={title}>
      <h3 className="font-bold">{title}</h3>
      <ErrorSummary problems={problems} />
      <TextField label="Name" {...field('name')} />
      <TextField label="E-mail" type="email" {...field('email')} />
      <TextField label="Phone" type="tel" {...field('phone')} />
      <p className="flex items-center gap-4">
        <Button type="submit" pending={isSending}>
          Save the {kind}
        </Button>
        <span role="status">{saved && 'Saved.'}</span>
      </p>
    </form>
  );
}
