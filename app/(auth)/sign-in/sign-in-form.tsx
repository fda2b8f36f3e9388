'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { signInAction, type SignInState } from './actions';

const EMPTY: SignInState = { email: '', problems: [], mailedTo: null };

export function SignInForm({ next }: { next: string }) {
  const [state, submit, isSending] = useActionState(signInAction, EMPTY);
  return (
    <form action={submit} noValidate className="grid gap-5">
      <ErrorSummary problems={state.problems} />
      {state.mailedTo && (
        <p role="status" className="border-y border-ink py-3">
          If {state.mailedTo} belongs to an account, a sign-in link is on its way. It counts for 10 minutes.
        </p>
      )}
      <input type="hidden" name="next" value={next} />
      <PostedText
        label="E-mail"
        name="email"
        type="email"
        autoComplete="username"
        defaultValue={state.email}
        problems={state.problems}
      />
      <PostedText
        label="Password"
        name="password"
        type="password"
        autoComplete="current-password"
        problems={state.problems}
      />
      <p className="flex flex-wrap items-center gap-3">
        <Button weight="solid" type="submit" pending={isSending}>
          Sign in
        </Button>
        <Button weight="plain" type="submit" name="intent" value="mail-link">
          Send me a sign-in link
        </Button>
      </p>
      <p className="text-s">
        <Link href="/forgot-password" className="inline-flex min-h-[44px] items-center underline">
          I forgot my password
        </Link>
      </p>
    </form>
  );
}
