'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { useForm, type FieldErrors } from 'react-hook-form';
import { WIRING_METHOD_LABELS } from '@/components/walk/labels';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { SelectField, TextField } from '@/components/ui/field';
import { STATE_PROFILES, WIRING_METHODS, type StateProfileCode } from '@/lib/findings/vocabulary';
import { TIME_ZONES } from '@/lib/schemas/account';
import { newInspectionSchema, type NewInspection } from '@/lib/schemas/inspection';
import { bookInspectionAction } from './actions';
import { US_STATES } from './us-states';

type Problem = { field: string; says: string };
type FormProps = {
  inspectors: { membershipId: string; name: string }[];
  leadMembershipId: string;
  timeZone: string;
  stateProfile: StateProfileCode;
};

/** A number field that is left empty says nothing; it never says zero. */
const orNothing = { setValueAs: (text: unknown) => (text === '' || text === undefined ? undefined : Number(text)) };
const yesNo = { setValueAs: (text: unknown) => (text === 'yes' ? true : text === 'no' ? false : undefined) };

/** House, people and time; the schema is the one that the server checks with. */
export function InspectionForm({ inspectors, leadMembershipId, timeZone, stateProfile }: FormProps) {
  const router = useRouter();
  const [problems, setProblems] = useState<Problem[]>([]);
  const form = useForm<NewInspection>({
    resolver: zodResolver(newInspectionSchema),
    shouldFocusError: false,
    defaultValues: {
      timeZone,
      stateProfile,
      leadMembershipId,
      wiringMethod: 'unknown',
      buyerEmail: '',
      agentEmail: '',
    },
  });
  const { register, formState } = form;
  const at = (field: string) => ({ id: field, error: problems.find((problem) => problem.field === field)?.says });

  /** The house's state brings its profile; the person can choose another. */
  function followState(event: { target: { value: string } }) {
    form.setValue('stateProfile', STATE_PROFILES.find((code) => code === event.target.value) ?? 'general');
  }

  async function book(values: NewInspection) {
    setProblems([]);
    const outcome = await bookInspectionAction(values).catch(() => null);
    if (outcome?.kind === 'booked') router.push(`/inspections/${outcome.inspectionId}`);
    else
      setProblems(
        outcome?.problems ?? [
          { field: 'buyerName', says: 'Not booked: no connection. What you typed is still here; try again.' },
        ],
      );
  }

  return (
    <form
      noValidate
      className="grid gap-8"
      onSubmit={(event) => void form.handleSubmit(book, (errors) => setProblems(problemsOf(errors)))(event)}
    >
      <ErrorSummary problems={problems} />
      <fieldset className="grid gap-4">
        <legend className="mb-3 font-serif text-l font-bold">House</legend>
        <TextField
          label="Street and number"
          autoComplete="off"
          {...at('address.street')}
          {...register('address.street')}
        />
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField label="Unit, if any" {...at('address.unit')} {...register('address.unit')} />
          <TextField label="City or town" {...at('address.city')} {...register('address.city')} />
          <TextField label="County" {...at('address.county')} {...register('address.county')} />
          <div className="grid grid-cols-2 gap-4">
            <SelectField
              label="State"
              {...at('address.state')}
              {...register('address.state', { onChange: followState })}
            >
              <option value="">Choose</option>
              {US_STATES.map((state) => (
                <option key={state}>{state}</option>
              ))}
            </SelectField>
            <TextField label="ZIP" inputMode="numeric" {...at('address.zip')} {...register('address.zip')} />
          </div>
          <TextField
            label="Year built"
            hint="Leave it empty if nobody knows"
            inputMode="numeric"
            {...at('yearBuilt')}
            {...register('yearBuilt', orNothing)}
          />
          <SelectField
            label="Wiring method, if known"
            hint="What the walls hold, as seen or told"
            {...at('wiringMethod')}
            {...register('wiringMethod')}
          >
            {WIRING_METHODS.toReversed().map((method) => (
              <option key={method} value={method}>
                {WIRING_METHOD_LABELS[method]}
              </option>
            ))}
          </SelectField>
          <SelectField label="Occupied" {...at('occupied')} {...register('occupied', yesNo)}>
            <option value="">Not known</option>
            <option value="yes">Yes</option>
            <option value="no">No</option>
          </SelectField>
          <SelectField label="Power on" {...at('utilitiesOn')} {...register('utilitiesOn', yesNo)}>
            <option value="">Not known</option>
            <option value="yes">Yes</option>
            <option value="no">No</option>
          </SelectField>
        </div>
      </fieldset>
      <fieldset className="grid gap-4">
        <legend className="mb-3 font-serif text-l font-bold">Visit</legend>
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField
            label="Day and time"
            type="datetime-local"
            {...at('scheduledLocal')}
            {...register('scheduledLocal')}
          />
          <SelectField label="Time zone of the house" {...at('timeZone')} {...register('timeZone')}>
            {TIME_ZONES.map(({ zone, says }) => (
              <option key={zone} value={zone}>
                {says}
              </option>
            ))}
          </SelectField>
          <SelectField label="Inspector" {...at('leadMembershipId')} {...register('leadMembershipId')}>
            {inspectors.map(({ membershipId, name }) => (
              <option key={membershipId} value={membershipId}>
                {name}
              </option>
            ))}
          </SelectField>
          <SelectField
            label="State profile"
            hint="Which state’s rules the report follows"
            {...at('stateProfile')}
            {...register('stateProfile')}
          >
            {STATE_PROFILES.map((code) => (
              <option key={code} value={code}>
                {code === 'general' ? 'General' : code}
              </option>
            ))}
          </SelectField>
        </div>
      </fieldset>
      <fieldset className="grid gap-4">
        <legend className="mb-3 font-serif text-l font-bold">Buyer and agent</legend>
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField label="Buyer’s name" {...at('buyerName')} {...register('buyerName')} />
          <TextField label="Buyer’s e-mail" type="email" {...at('buyerEmail')} {...register('buyerEmail')} />
          <TextField label="Buyer’s phone" type="tel" {...at('buyerPhone')} {...register('buyerPhone')} />
          <span />
          <TextField label="Agent’s name, if any" {...at('agentName')} {...register('agentName')} />
          <TextField label="Agent’s e-mail" type="email" {...at('agentEmail')} {...register('agentEmail')} />
        </div>
      </fieldset>
      <p>
        <Button weight="solid" type="submit" pending={formState.isSubmitting}>
          Book it
        </Button>
      </p>
    </form>
  );
}

/** The form's own tree of errors as a flat list, in the order of the fields. */
function problemsOf(errors: FieldErrors<NewInspection>, path = ''): Problem[] {
  return Object.entries(errors).flatMap(([key, error]) => {
    if (!error || typeof error !== 'object') return [];
    const field = path ? `${path}.${key}` : key;
    if ('message' in error && typeof error.message === 'string') return [{ field, says: error.message }];
    return problemsOf(error as FieldErrors<NewInspection>, field);
  });
}
