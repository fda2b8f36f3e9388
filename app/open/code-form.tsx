'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { openByCodeAction } from './actions';

export function CodeForm() {
  const [{ email, problems }, submit, isSending] = useActionState(openByCodeAction, { email: '', problems: [] });
  return (
    <form action={submit} noValidate className="grid gap-5">
      <ErrorSummary problems={problems} />
      <PostedText
        label="E-mail the mail was sent to"
        name="email"
        type="email"
        autoComplete="email"
        defaultValue={email}
        problems={problems}
      />
      <PostedText
        label="Short code"
        name="code"
        autoComplete="one-time-code"
        hint="Like ABCDE-23456"
        problems={problems}
      />
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Open by code
        </Button>
      </p>
    </form>
  );
}
