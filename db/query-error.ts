import 'server-only';
import { DrizzleQueryError } from 'drizzle-orm/errors';

/**
 * The same error without the values of its statement. They hold addresses, hashes and, where a mail is asked for, the
 * token of a link; whatever prints the error would print them too. Other errors are answered as they are.
 */
export function withoutValues(error: unknown): unknown {
  if (!(error instanceof DrizzleQueryError)) return error;
  const [full, plain] = [error.message, `Failed query: ${error.query}`];
  error.message = plain;
  error.params = [];
  if (error.stack) error.stack = error.stack.replace(full, plain);
  // The server repeats values here: "Key (email)=(…) already exists".
  if (error.cause && 'detail' in error.cause) error.cause.detail = undefined;
  return error;
}
