import type { ComponentProps } from 'react';
import { SelectField, TextField } from './field';

type Problems = { problems: { field: string; says: string }[] };
type Posted = Problems & { name: string; label: string; hint?: string };

/** A text field of a posted form, whose name is also its id; it picks its own problem from those that came back. */
export function PostedText({ name, problems, ...rest }: Posted & Omit<ComponentProps<'input'>, 'name' | 'id'>) {
  return <TextField id={name} name={name} error={problemAt(name, problems)} {...rest} />;
}

/** The same for a choice; `options` are pairs of value and words. */
export function PostedSelect({
  name,
  problems,
  options,
  ...rest
}: Posted & { options: readonly (readonly [string, string])[] } & Omit<ComponentProps<'select'>, 'name' | 'id'>) {
  return (
    // React 19 resets a form after its action; the key makes the choice that came back the new starting value.
    <SelectField key={String(rest.defaultValue)} id={name} name={name} error={problemAt(name, problems)} {...rest}>
      {options.map(([value, says]) => (
        <option key={value} value={value}>
          {says}
        </option>
      ))}
    </SelectField>
  );
}

function problemAt(name: string, problems: Problems['problems']): string | undefined {
  return problems.find(({ field }) => field === name)?.says;
}
