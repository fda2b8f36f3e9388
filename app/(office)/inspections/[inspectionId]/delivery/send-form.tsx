'use client';

import { useActionState } from 'react';
import type { SendReportOutcome } from '@/db/grants';
import { Button } from '@/components/ui/button';
import { sendReportAction } from './actions';

type SendFormProps = { inspectionId: string; partyId: string; label: string; isFirst: boolean };

export function SendForm({ inspectionId, partyId, label, isFirst }: SendFormProps) {
  const [{ outcome }, action, isPending] = useActionState(sendReportAction, { outcome: null });
  return (
    <form action={action} className="grid gap-2">
      <input type="hidden" name="inspectionId" value={inspectionId} />
      <input type="hidden" name="partyId" value={partyId} />
      <Button type="submit" weight={isFirst ? 'solid' : 'outline'} pending={isPending} className="justify-self-start">
        {isFirst ? label : `${label} again, with a new link`}
      </Button>
      {outcome && <p role="status">{wordsOf(outcome)}</p>}
    </form>
  );
}

function wordsOf(outcome: SendReportOutcome): string {
  switch (outcome.kind) {
    case 'sent':
      return 'The mail is on its way.';
    case 'already-waiting':
      return 'A mail to this address is already on its way.';
    case 'no-email':
      return 'There is no e-mail address. Add it in Visit.';
    case 'not-released':
      return 'Nothing is released yet.';
    case 'not-allowed':
      return 'You may not send this report.';
    case 'not-found':
      return 'This person is no longer part of the inspection. Look at Visit.';
  }
}
