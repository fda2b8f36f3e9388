/** A field of a posted form as text; a file or nothing is an empty text. */
export function textOf(form: FormData, name: string): string {
  const value = form.get(name);
  return typeof value === 'string' ? value : '';
}

/** Several fields of a form as texts, to parse and to show again. */
export function textsOf<Name extends string>(form: FormData, names: readonly Name[]): Record<Name, string> {
  return Object.fromEntries(names.map((name) => [name, textOf(form, name)])) as Record<Name, string>;
}
