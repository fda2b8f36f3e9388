import type { ComponentProps } from 'react';

type Weight = 'log' | 'solid' | 'outline' | 'quiet';
const SHAPE: Record<Weight, string> = {
  log: 'min-h-[72px] w-full bg-inverse text-on-inverse border-inverse text-l font-bold',
  solid: 'min-h-[56px] bg-inverse text-on-inverse border-inverse font-bold',
  outline: 'min-h-[56px] bg-transparent text-ink border-ink font-bold',
  quiet: 'min-h-[56px] border-transparent text-ink underline underline-offset-4',
};

/** A button that says what it will record; the second line is what it writes down. */
export function WalkButton({
  weight = 'outline',
  records,
  className = '',
  children,
  ...rest
}: { weight?: Weight; records?: string } & ComponentProps<'button'>) {
  return (
    <button
      type="button"
      className={`flex flex-col items-center justify-center gap-1 rounded-[2px] border-(length:--line-2) px-4 py-2 text-center leading-tight ${SHAPE[weight]} ${className}`}
      {...rest}
    >
      <span>{children}</span>
      {records && <span className="text-s font-normal">{records}</span>}
    </button>
  );
}

/** Choices of which one is on; a second tap takes it back. */
export function Choices<Value extends string>({
  legend,
  options,
  value,
  onChange,
  columns = 2,
}: {
  legend: string;
  options: readonly (readonly [Value, string])[];
  value: Value | undefined;
  onChange: (value: Value | undefined) => void;
  columns?: 1 | 2 | 3;
}) {
  const grid = { 1: 'grid-cols-1', 2: 'grid-cols-2', 3: 'grid-cols-3' }[columns];
  return (
    <fieldset className="grid gap-2">
      <legend className="mb-2 font-bold">{legend}</legend>
      <div className={`grid gap-2 ${grid}`}>
        {options.map(([option, label]) => (
          <button
            key={option}
            type="button"
            aria-pressed={value === option}
            onClick={() => onChange(value === option ? undefined : option)}
            className={`min-h-[56px] rounded-[2px] border-(length:--line) px-3 py-2 leading-tight ${
              value === option ? 'border-inverse bg-inverse font-bold text-on-inverse' : 'border-rule'
            }`}
          >
            {label}
          </button>
        ))}
      </div>
    </fieldset>
  );
}
