/** The face of a receptacle, in ink. */
export function BrandMark() {
  return (
    <svg viewBox="0 0 22 22" width="22" height="22" aria-hidden="true" className="shrink-0" fill="none">
      <path d="M6 1h10c3 2.4 4.5 6 4.5 10S19 18.6 16 21H6C3 18.6 1.5 15 1.5 11S3 3.4 6 1Z" fill="var(--ink)" />
      <rect x="6.6" y="5" width="2.2" height="5.4" fill="var(--paper)" />
      <rect x="13.2" y="5.5" width="2.2" height="4.4" fill="var(--paper)" />
      <path d="M8.8 17.4v-2.6a2.2 2.2 0 0 1 4.4 0v2.6Z" fill="var(--paper)" />
    </svg>
  );
}
