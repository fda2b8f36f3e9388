import type { Problem } from '@/lib/schemas/account';

/** What to tell a person who tried too often. */
export function waitProblem(field: string, seconds: number): Problem {
  const minutes = Math.ceil(seconds / 60);
  const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`;
  return { field, says: `Too many tries. Wait ${wait}, then try again.` };
}
