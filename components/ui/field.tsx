import type { ComponentProps, ReactNode } from 'react';

type FieldProps = { id: string; label: string; hint?: string; error?: string };

/** Label, control, hint and error of one field; the control is given the ids that tie them together. */
export function Field({ id, label, hint, error, children }: FieldProps & { children: (ids: ControlIds) => ReactNode }) {
  const hintId = hint ? `${id}-hint` : undefined;
  const errorId = error ? `${id}-error` : undefined;
  return (
    <div className="grid content-start gap-1">
      <label htmlFor={id} className="text-s font-bold">
        {label}
      </label>
      {hint && (
        <p id={hintId} className="text-s text-ink-2">
          {hint}
        </p>
      )}
      {children({
        id,
        'aria-invalid': error !== undefined,
        'aria-describedby': [hintId, errorId].filter(Boolean).join(' ') || undefined,
      })}
      {error && (
        <p id={errorId} className="text-s font-bold">
          <span aria-hidden="true">▲ </span>
          {error}
        </p>
      )}
    </div>
  );
}

export type ControlIds = { id: string; 'aria-invalid': boolean; 'aria-describedby': string | undefined };

export function TextField({ id, label, hint, error, ...input }: FieldProps & ComponentProps<'input'>) {
  return (
    <Field id={id} label={label} hint={hint} error={error}>
      {(ids) => <input className="control" {...ids} {...input} />}
    </Field>
  );
}

export function TextArea({ id, label, hint, error, ...input }: FieldProps & ComponentProps<'textarea'>) {
  return (
    <Field id={id} label={label} hint={hint} error={error}>
      {(ids) => <textarea rows={4} className="control" {...ids} {...input} />}
    </Field>
  );
}

export function SelectField({ id, label, hint, error, children, ...select }: FieldProps & ComponentProps<'select'>) {
  return (
    <Field id={id} label={label} hint={hint} error={error}>
      {(ids) => (
        <select className="control" {...ids} {...select}>
          {children}
        </select>
      )}
    </Field>
  );
}

export function CheckField({ id, label, hint, ...input }: Omit<FieldProps, 'error'> & ComponentProps<'input'>) {
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="flex min-h-[44px] items-center gap-3">
        <input
          id={id}
          type="checkbox"
          className="size-6 shrink-0 accent-ink"
          aria-describedby={hint ? `${id}-hint` : undefined}
          {...input}
        />
        {label}
      </label>
      {hint && (
        <p id={`${id}-hint`} className="text-s text-ink-2">
          {hint}
        </p>
      )}
    </div>
  );
}
