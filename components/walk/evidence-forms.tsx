'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch, type FieldError, type UseFormRegisterReturn } from 'react-hook-form';
import { z } from 'zod';
import type { ContactSensor, LoadTest, VoltTrio } from '@/lib/findings/facts';
import { loadTestSchema, voltTrioSchema, wiringEvidenceSchema } from '@/lib/schemas/reading';
import { Choices, WalkButton } from './walk-button';

/** Three voltages between the slots, with the meter that was used. */
export function MeterForm({ meter, onSave }: { meter: VoltTrio['meter']; onSave: (trio: VoltTrio) => Promise<void> }) {
  const form = useForm<VoltTrio>({ resolver: zodResolver(voltTrioSchema), defaultValues: { meter } });
  const usedMeter = useWatch({ control: form.control, name: 'meter' });
  const { errors } = form.formState;
  return (
    <form className="grid gap-3" noValidate onSubmit={(event) => void form.handleSubmit(onSave)(event)}>
      <Choices
        legend="Which meter?"
        options={[
          ['high-impedance', 'High impedance'],
          ['low-impedance', 'Low impedance'],
        ]}
        value={usedMeter}
        onChange={(value) => value && form.setValue('meter', value)}
      />
      <div className="grid grid-cols-3 gap-2">
        <NumberField label="H–N, V" field={form.register('hn', { valueAsNumber: true })} error={errors.hn} />
        <NumberField label="H–G, V" field={form.register('hg', { valueAsNumber: true })} error={errors.hg} />
        <NumberField label="N–G, V" field={form.register('ng', { valueAsNumber: true })} error={errors.ng} />
      </div>
      <WalkButton weight="solid" type="submit">
        Record the three voltages
      </WalkButton>
    </form>
  );
}

/** Which places make a non-contact detector respond. A quiet slot counts only where the hot slot answered. */
export function SensorForm({
  value,
  onSave,
}: {
  value: ContactSensor;
  onSave: (sensor: ContactSensor) => Promise<void>;
}) {
  const places: [keyof ContactSensor, string][] = [
    ['hotSlot', 'Hot slot'],
    ['neutralSlot', 'Neutral slot'],
    ['groundSlot', 'Ground slot'],
    ['coverScrew', 'Cover screw'],
  ];
  const shown = (answer: boolean | undefined) => (answer === undefined ? undefined : answer ? 'responds' : 'quiet');
  return (
    <div className="grid gap-3">
      <p>
        Prove the sensor on a known live outlet before and after. It can miss, so a quiet slot proves little by itself.
      </p>
      {places.map(([place, label]) => (
        <Choices
          key={place}
          legend={label}
          options={[
            ['responds', 'Responds'],
            ['quiet', 'Quiet'],
          ]}
          value={shown(value[place])}
          onChange={(answer) =>
            void onSave(answer === undefined ? without(value, place) : { ...value, [place]: answer === 'responds' })
          }
        />
      ))}
    </div>
  );
}

function without(value: ContactSensor, place: keyof ContactSensor): ContactSensor {
  const { [place]: _cleared, ...rest } = value;
  return rest;
}

/** Voltages without and with a 12 to 15 A plug-in load. */
export function LoadForm({ onSave }: { onSave: (test: LoadTest) => Promise<void> }) {
  const form = useForm<LoadTest>({ resolver: zodResolver(loadTestSchema) });
  const { errors } = form.formState;
  const optional = {
    setValueAs: (text: string | number | undefined) => (text === '' || text === undefined ? undefined : Number(text)),
  };
  return (
    <form className="grid gap-3" noValidate onSubmit={(event) => void form.handleSubmit(onSave)(event)}>
      <NumberField label="Load, A" field={form.register('amps', { valueAsNumber: true })} error={errors.amps} />
      <div className="grid grid-cols-2 gap-2">
        <NumberField
          label="H–N without load, V"
          field={form.register('noLoadHn', { valueAsNumber: true })}
          error={errors.noLoadHn}
        />
        <NumberField
          label="H–N with load, V"
          field={form.register('loadedHn', { valueAsNumber: true })}
          error={errors.loadedHn}
        />
        <NumberField label="N–G without load, V" field={form.register('noLoadNg', optional)} error={errors.noLoadNg} />
        <NumberField label="N–G with load, V" field={form.register('loadedNg', optional)} error={errors.loadedNg} />
      </div>
      <WalkButton weight="solid" type="submit">
        Record the load test
      </WalkButton>
    </form>
  );
}

const groundSchema = z.strictObject({ groundOhms: wiringEvidenceSchema.shape.groundOhms.unwrap() });

export function GroundForm({ onSave }: { onSave: (ohms: number) => Promise<void> }) {
  const form = useForm<{ groundOhms: number }>({ resolver: zodResolver(groundSchema) });
  return (
    <form
      className="grid gap-3"
      noValidate
      onSubmit={(event) => void form.handleSubmit(({ groundOhms }) => onSave(groundOhms))(event)}
    >
      <p>These instruments trip GFCIs and have no place near patients.</p>
      <NumberField
        label="Ground path, ohms"
        field={form.register('groundOhms', { valueAsNumber: true })}
        error={form.formState.errors.groundOhms}
      />
      <WalkButton weight="solid" type="submit">
        Record the ground path
      </WalkButton>
    </form>
  );
}

function NumberField({ label, field, error }: { label: string; field: UseFormRegisterReturn; error?: FieldError }) {
  const errorId = `${field.name}-error`;
  return (
    <label className="grid content-start gap-1 text-s">
      {label}
      <input
        {...field}
        type="text"
        inputMode="decimal"
        autoComplete="off"
        aria-invalid={error !== undefined}
        aria-describedby={errorId}
        className={`min-h-[56px] w-full rounded-[2px] bg-sheet px-3 text-right text-m ${error ? 'border-2 border-ink' : 'border border-rule'}`}
      />
      <span id={errorId} role="alert" className="font-bold empty:hidden">
        {error && `▲ ${error.message}`}
      </span>
    </label>
  );
}
