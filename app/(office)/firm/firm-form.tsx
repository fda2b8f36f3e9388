'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedSelect, PostedText } from '@/components/ui/posted-field';
import { TIME_ZONES, type Problem } from '@/lib/schemas/account';
import { STATE_NAMES } from '@/lib/schemas/state-names';
import { saveFirmAction, type FirmValues } from './actions';

export function FirmForm({ values: saved }: { values: FirmValues }) {
  const [{ values, problems, isSaved }, submit, isSending] = useActionState(saveFirmAction, {
    values: saved,
    problems: [],
    isSaved: false,
  });
  return (
    <form action={submit} noValidate className="grid gap-5">
      <ErrorSummary problems={problems} />
      {isSaved && (
        <p role="status" className="border-y border-ink py-3">
          Saved. Reports released from now on show it.
        </p>
      )}
      <PostedText
        label="Name of the firm"
        name="name"
        autoComplete="organization"
        defaultValue={values.name}
        problems={problems}
      />
      <AddressFields address={values.address} problems={problems} />
      <PostedText
        label="Phone"
        name="phone"
        type="tel"
        autoComplete="tel"
        defaultValue={values.phone}
        problems={problems}
      />
      <PostedText
        label="E-mail that buyers may write to"
        name="email"
        type="email"
        autoComplete="email"
        defaultValue={values.email}
        problems={problems}
      />
      <PostedText
        label="License number of the firm"
        name="licenseNumber"
        defaultValue={values.licenseNumber}
        problems={problems}
      />
      <PostedSelect
        label="State profile"
        name="stateProfile"
        defaultValue={values.stateProfile}
        options={STATE_NAMES}
        hint="Which duties the program reminds you of. Confirm them with your regulator."
        problems={problems}
      />
      <PostedSelect
        label="Time zone"
        name="timeZone"
        defaultValue={values.timeZone}
        options={TIME_ZONES.map(({ zone, says }) => [zone, says] as const)}
        problems={problems}
      />
      <label className="flex min-h-[44px] items-center gap-3">
        <input
          type="checkbox"
          name="sharedDrafts"
          value="yes"
          defaultChecked={values.sharedDrafts}
          className="size-5 shrink-0 accent-ink"
        />
        Inspectors see each other’s drafts
      </label>
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Save the firm
        </Button>
      </p>
    </form>
  );
}

function AddressFields({ address, problems }: { address: FirmValues['address']; problems: Problem[] }) {
  return (
    <fieldset className="grid gap-4">
      <legend className="mb-2 font-bold">Address</legend>
      <PostedText
        label="Street and number"
        name="street"
        autoComplete="address-line1"
        defaultValue={address.street}
        problems={problems}
      />
      <PostedText
        label="Suite or unit"
        name="unit"
        autoComplete="address-line2"
        defaultValue={address.unit}
        problems={problems}
      />
      <PostedText
        label="City"
        name="city"
        autoComplete="address-level2"
        defaultValue={address.city}
        problems={problems}
      />
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-3">
        <PostedText
          label="State"
          name="state"
          autoComplete="address-level1"
          defaultValue={address.state}
          problems={problems}
        />
        <PostedText label="ZIP" name="zip" autoComplete="postal-code" defaultValue={address.zip} problems={problems} />
        <PostedText label="County" name="county" defaultValue={address.county} problems={problems} />
      </div>
    </fieldset>
  );
}
