'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { mailResetAction, type ForgotState } from './actions';

const EMPTY: ForgotState = { email: '', problems: [], mailedTo: null };

export function ForgotPasswordForm() {
  const [state, submit, isSending] = useActionState(mailResetAction, EMPTY);
  return (
    <form action={submit} noValidate className="grid gap-5">
      <ErrorSummary problems={state.problems} />
      {state.mailedTo && (
        <p role="status" className="border-y border-ink py-3">
          If {state.mailedTo} belongs to an account, a link is on its way. It counts for 10 minutes and once.
        </p>
      )}
      <PostedText
        label="E-mail"
        name="email"
        type="email"
        autoComplete="username"
        defaultValue={state.email}
        problems={state.problems}
      />
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Mail me a link
        </Button>
      </p>
    </form>
  );
}
