'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedSelect, PostedText } from '@/components/ui/posted-field';
import { TIME_ZONES } from '@/lib/schemas/account';
import { STATE_NAMES } from '@/lib/schemas/state-names';
import { signUpAction, type SignUpState } from './actions';

const EMPTY: SignUpState = {
  values: { firmName: '', name: '', email: '', stateProfile: 'general', timeZone: 'America/New_York' },
  problems: [],
};

export function SignUpForm() {
  const [{ values, problems }, submit, isSending] = useActionState(signUpAction, EMPTY);
  return (
    <form action={submit} noValidate className="grid gap-5">
      <ErrorSummary problems={problems} />
      <PostedText
        label="Name of the firm"
        name="firmName"
        autoComplete="organization"
        defaultValue={values.firmName}
        problems={problems}
      />
      <PostedSelect
        label="State you work in"
        name="stateProfile"
        defaultValue={values.stateProfile}
        options={STATE_NAMES}
        problems={problems}
      />
      <PostedSelect
        label="Time zone"
        name="timeZone"
        defaultValue={values.timeZone}
        options={TIME_ZONES.map(({ zone, says }) => [zone, says] as const)}
        problems={problems}
      />
      <PostedText
        label="Your full name"
        name="name"
        autoComplete="name"
        defaultValue={values.name}
        problems={problems}
      />
      <PostedText
        label="E-mail"
        name="email"
        type="email"
        autoComplete="username"
        defaultValue={values.email}
        problems={problems}
      />
      <PostedText
        label="Password"
        name="password"
        type="password"
        autoComplete="new-password"
        hint="At least 12 characters. Three or four plain words that do not belong together do well."
        problems={problems}
      />
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Set up the firm
        </Button>
      </p>
    </form>
  );
}
