'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { changePasswordAction, type PasswordState } from './actions';

const EMPTY: PasswordState = { problems: [], isSaved: false };

export function PasswordForm({ email }: { email: string }) {
  const [{ problems, isSaved }, submit, isSending] = useActionState(changePasswordAction, EMPTY);
  return (
    <form action={submit} noValidate className="mt-4 grid gap-5">
      <ErrorSummary problems={problems} />
      {isSaved && (
        <p role="status" className="border-y border-ink py-3">
          Your new password is set. You are signed out everywhere else.
        </p>
      )}
      <input type="hidden" name="email" value={email} autoComplete="username" />
      <PostedText
        label="Present password"
        name="current"
        type="password"
        autoComplete="current-password"
        problems={problems}
      />
      <PostedText
        label="New password"
        name="password"
        type="password"
        autoComplete="new-password"
        hint="At least 12 characters. Three or four plain words that do not belong together do well."
        problems={problems}
      />
      <p>
        <Button type="submit" pending={isSending}>
          Change the password
        </Button>
      </p>
    </form>
  );
}
