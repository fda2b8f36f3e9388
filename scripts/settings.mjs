import { createHash } from 'node:crypto';
import { Stop } from './say.mjs';

const DATABASE_NAMES = ['DATABASE_URL', 'DATABASE_OWNER_URL', 'DATABASE_JOBS_URL'];
const LOOPBACK = new Set(['127.0.0.1', 'localhost', '[::1]', '::1']);

/**
 * What kind of start the variables ask for. `isPrivate`: on the clone's own database. `isLocal`: that, and nobody but
 * this machine can reach it; the demo, the mail sink and the payment fake run then and never otherwise.
 * Throws a Stop that names what is missing.
 */
export function planStart(given) {
  const named = DATABASE_NAMES.filter((name) => given[name]);
  const unnamed = DATABASE_NAMES.filter((name) => !given[name]);
  if (named.length > 0 && unnamed.length > 0)
    throw new Stop(`${named[0]} is set, so ${unnamed.join(' and ')} must be too: README.md says how.`);
  const isPrivate = named.length === 0;
  const address = parseAddress(given.APP_URL);
  const host = given.HOST || '127.0.0.1';
  const isLocal = isPrivate && LOOPBACK.has(host) && (address === null || LOOPBACK.has(address.hostname));
  if (!isLocal) requireOutside(given, { isPrivate, host, address });
  const port = parsePort(given.PORT || (isLocal && address?.port) || '');
  return { isPrivate, isLocal, host, port, address };
}

/** Sessions and server actions need their keys on each machine; one secret is enough to make both. */
export function actionsKey(authSecret) {
  return createHash('sha256').update(`server actions ${authSecret}`).digest('base64');
}

function requireOutside(given, { isPrivate, host, address }) {
  const why = !isPrivate ? 'on a database of your own' : `for others than this machine (${address?.hostname ?? host})`;
  const needs = { APP_URL: 'the address that people open', SMTP_URL: 'the mail server' };
  if (!isPrivate) needs.AUTH_SECRET = 'a random text of at least 32 characters';
  for (const [name, what] of Object.entries(needs)) {
    if (!given[name]) throw new Stop(`To run ${why}, set ${name}: ${what}.`);
  }
}

function parseAddress(text) {
  if (!text) return null;
  const address = URL.canParse(text) ? new URL(text) : null;
  if (address && /^https?:$/.test(address.protocol)) return address;
  throw new Stop(`APP_URL is "${text}", which is no address: it reads like https://ohmstead.example`);
}

function parsePort(text) {
  if (text === '') return null;
  if (/^\d+$/.test(text) && Number(text) > 0 && Number(text) < 65_536) return Number(text);
  throw new Stop(`PORT is "${text}": it is a number from 1 to 65535.`);
}
