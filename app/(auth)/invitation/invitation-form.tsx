'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { acceptInvitationAction } from './actions';

export function InvitationForm({ name, isNew }: { name: string; isNew: boolean }) {
  const [state, submit, isSending] = useActionState(acceptInvitationAction, { name, problems: [] });
  return (
    <form action={submit} noValidate className="grid gap-5">
      <ErrorSummary problems={state.problems} />
      {isNew && (
        <>
          <PostedText
            label="Your full name"
            name="name"
            autoComplete="name"
            defaultValue={state.name}
            problems={state.problems}
          />
          <PostedText
            label="Password"
            name="password"
            type="password"
            autoComplete="new-password"
            hint="At least 12 characters. Three or four plain words that do not belong together do well."
            problems={state.problems}
          />
        </>
      )}
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Join the firm
        </Button>
      </p>
    </form>
  );
}
