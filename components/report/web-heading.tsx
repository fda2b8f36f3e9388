/** The head of a section of the web report. */
export function WebHeading({ id, children }: { id: string; children: string }) {
  return (
    <h2 id={id} className="mb-2 border-b-2 border-ink pb-2 font-serif text-xl font-bold">
      {children}
    </h2>
  );
}
