'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { saveProfileAction, type ProfileState } from './actions';

export function ProfileForm({ values: saved }: { values: ProfileState['values'] }) {
  const [{ values, problems, isSaved }, submit, isSending] = useActionState(saveProfileAction, {
    values: saved,
    problems: [],
    isSaved: false,
  });
  return (
    <form action={submit} noValidate className="mt-6 grid gap-5">
      <ErrorSummary problems={problems} />
      {isSaved && (
        <p role="status" className="border-y border-ink py-3">
          Saved. Reports released from now on show it.
        </p>
      )}
      <PostedText label="Full name" name="name" autoComplete="name" defaultValue={values.name} problems={problems} />
      <PostedText
        label="License number"
        name="licenseNumber"
        defaultValue={values.licenseNumber}
        hint="Printed under your signature where your state licenses inspectors."
        problems={problems}
      />
      <PostedText
        label="State of the license"
        name="licenseState"
        defaultValue={values.licenseState}
        hint="Two letters, like OH"
        problems={problems}
      />
      <PostedText
        label="License expires"
        name="licenseExpires"
        type="date"
        defaultValue={values.licenseExpires}
        problems={problems}
      />
      <PostedText
        label="Name as signed"
        name="signatureName"
        defaultValue={values.signatureName}
        hint="Stands under the signature in reports."
        problems={problems}
      />
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Save
        </Button>
      </p>
    </form>
  );
}
