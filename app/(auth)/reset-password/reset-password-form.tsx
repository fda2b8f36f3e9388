'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { resetPasswordAction, type ResetState } from './actions';

const EMPTY: ResetState = { problems: [] };

export function ResetPasswordForm({ email }: { email: string }) {
  const [state, submit, isSending] = useActionState(resetPasswordAction, EMPTY);
  return (
    <form action={submit} noValidate className="grid gap-5">
      <ErrorSummary problems={state.problems} />
      <input type="hidden" name="email" value={email} autoComplete="username" />
      <PostedText
        label="New password"
        name="password"
        type="password"
        autoComplete="new-password"
        hint="At least 12 characters. Three or four plain words that do not belong together do well."
        problems={state.problems}
      />
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Set the password
        </Button>
      </p>
    </form>
  );
}
