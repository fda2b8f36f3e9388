'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import type { InspectionState } from '@/lib/findings/vocabulary';
import { cancelBookingAction, reopenBookingAction, type BookingState } from './actions';

const START: BookingState = { says: '' };

/** Cancel with a reason, or take a cancelled or closed inspection up again. */
export function BookingForm({ inspectionId, state }: { inspectionId: string; state: InspectionState }) {
  const isOver = state === 'cancelled' || state === 'closed';
  const [cancelled, cancel, isCancelling] = useActionState(cancelBookingAction.bind(null, inspectionId), START);
  const [reopened, reopen, isOpening] = useActionState(reopenBookingAction.bind(null, inspectionId), START);
  if (isOver) {
    return (
      <form action={reopen} className="mt-4 grid gap-3">
        <p>This inspection is {state}. Nothing in it can be changed until it is open again.</p>
        <p>
          <Button type="submit" pending={isOpening}>
            Open it again
          </Button>
        </p>
        <p role="alert">{reopened.says}</p>
      </form>
    );
  }
  if (state === 'released') return <p className="mt-4">Released. Close it under Delivery once the buyer has it.</p>;
  return (
    <form action={cancel} className="mt-4 grid max-w-[480px] gap-3">
      <TextField
        id="reason"
        name="reason"
        label="Reason, to cancel this inspection"
        error={cancelled.says || undefined}
      />
      <p>
        <Button type="submit" pending={isCancelling}>
          Cancel the inspection
        </Button>
      </p>
    </form>
  );
}
