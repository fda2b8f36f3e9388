import 'server-only';
import { createHash } from 'node:crypto';
import { VISITOR } from '@/db/actor';
import { clearAttempts, findAccount, giveBackAttempt, takeAttempt, type AttemptLimit } from '@/db/auth';
import { env } from '@/lib/env';
import { emailSchema } from '@/lib/schemas/email';
import { isPasswordOf } from './password';

const QUARTER_HOUR = 15 * 60;
const PER_ACCOUNT: AttemptLimit = { limit: 5, windowSeconds: QUARTER_HOUR, grows: true };
const PER_ADDRESS: AttemptLimit = { limit: 30, windowSeconds: QUARTER_HOUR, grows: false };
const MAILS_PER_ACCOUNT: AttemptLimit = { limit: 3, windowSeconds: QUARTER_HOUR, grows: false };

export type Visitor = { address: string; userAgent: string };
export type PasswordOutcome =
  { kind: 'signed-in'; userId: string; email: string } | { kind: 'refused' } | { kind: 'wait'; seconds: number };

/** The same answer, after the same work, for an unknown e-mail, a disabled person and a wrong password. */
export async function checkPassword(email: string, password: string, visitor: Visitor): Promise<PasswordOutcome> {
  const parsed = emailSchema.safeParse(email);
  const canonical = parsed.success ? parsed.data : '';
  const wait = await attemptAllowed('sign-in', canonical, visitor, PER_ACCOUNT);
  if (wait > 0) return { kind: 'wait', seconds: wait };

  const account = await findAccount(VISITOR, canonical);
  const matches = await isPasswordOf(account?.passwordHash ?? null, password);
  if (!account || !matches) return { kind: 'refused' };
  await clearAttempts(VISITOR, accountKey('sign-in', canonical));
  await giveBackAttempt(VISITOR, addressKey('sign-in', visitor));
  return { kind: 'signed-in', userId: account.userId, email: canonical };
}

/** Seconds to wait before a short code from a mail may be tried for this e-mail; 0 to go on. */
export function codeAttempt(email: string, visitor: Visitor): Promise<number> {
  return attemptAllowed('code', email, visitor, PER_ACCOUNT);
}

/** Seconds to wait before a signed-in person may try their present password again; counted with their sign-ins. */
export function passwordAttempt(email: string): Promise<number> {
  return takeAttempt(VISITOR, accountKey('sign-in', email), PER_ACCOUNT);
}

/** Seconds to wait before another mail may be asked for; 0 to go on. */
export function mailAttempt(email: string, visitor: Visitor): Promise<number> {
  return attemptAllowed('mail', email, visitor, MAILS_PER_ACCOUNT);
}

/** Seconds to wait before this address may open links, or found firms, again; 0 to go on. */
export function addressAttempt(what: 'open' | 'sign-up', visitor: Visitor): Promise<number> {
  return takeAttempt(VISITOR, addressKey(what, visitor), PER_ADDRESS);
}

/** A link or code that opened something does not count against the reader. */
export function forgiveAddress(what: 'open', visitor: Visitor): Promise<void> {
  return giveBackAttempt(VISITOR, addressKey(what, visitor));
}

export async function forgiveCode(email: string, visitor: Visitor): Promise<void> {
  await clearAttempts(VISITOR, accountKey('code', email));
  await giveBackAttempt(VISITOR, addressKey('code', visitor));
}

/** A person who proved their mailbox starts over with sign-in attempts. */
export function forgetAttempts(email: string): Promise<void> {
  return clearAttempts(VISITOR, accountKey('sign-in', email));
}

/** The last hop that is not a proxy of ours: what stands left of it is the caller's own word. */
export function visitorOf(requestHeaders: Headers): Visitor {
  const hops = (requestHeaders.get('x-forwarded-for') ?? '').split(',').map((hop) => hop.trim());
  const address = hops.findLast((hop) => !env.TRUSTED_PROXIES.includes(hop)) ?? hops[0] ?? '';
  return { address, userAgent: requestHeaders.get('user-agent') ?? '' };
}

async function attemptAllowed(what: string, email: string, visitor: Visitor, rule: AttemptLimit): Promise<number> {
  const byAddress = await takeAttempt(VISITOR, addressKey(what, visitor), PER_ADDRESS);
  return byAddress > 0 ? byAddress : takeAttempt(VISITOR, accountKey(what, email), rule);
}

/** Keys are hashes: the table of attempts names nobody. */
function accountKey(what: string, email: string): string {
  return `${what}:account:${createHash('sha256').update(email).digest('base64url')}`;
}

function addressKey(what: string, visitor: Visitor): string {
  return `${what}:address:${createHash('sha256').update(visitor.address).digest('base64url')}`;
}
