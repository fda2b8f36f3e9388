import { createHash, randomBytes, randomInt } from 'node:crypto';
import { env } from '@/lib/env';

/** Letters and figures that are not mistaken for each other when copied from a mail by hand. */
const CODE_ALPHABET = '23456789ABCDEFGHJKMNPQRSTVWXYZ';
const CODE_LENGTH = 10;

export const INVITATION_SECONDS = 7 * 24 * 60 * 60;
export const RESET_SECONDS = 10 * 60;

export type MintedLink = { token: string; code: string; tokenHash: Buffer; codeHash: Buffer };

/** A one-time secret for one mail. Only the two hashes are stored. */
export function mintLink(email: string): MintedLink {
  const token = randomBytes(32).toString('base64url');
  const code = Array.from({ length: CODE_LENGTH }, () => CODE_ALPHABET[randomInt(CODE_ALPHABET.length)]).join('');
  return { token, code: printedCode(code), tokenHash: hashToken(token), codeHash: hashCode(email, code) };
}

export function hashToken(token: string): Buffer {
  return createHash('sha256').update(token).digest();
}

/** The code counts only together with the address it was mailed to. Spaces, dashes and case are the reader's. */
export function hashCode(email: string, code: string): Buffer {
  const bare = code.toUpperCase().replace(/[^0-9A-Z]/g, '');
  return createHash('sha256').update(`code\n${email}\n${bare}`).digest();
}

function printedCode(code: string): string {
  return `${code.slice(0, CODE_LENGTH / 2)}-${code.slice(CODE_LENGTH / 2)}`;
}

/** What a mail carries, with the hashes that are stored. The address comes from the settings, never from a request. */
export function mintMailedLink(email: string): { tokenHash: Buffer; codeHash: Buffer; address: string; code: string } {
  const { token, code, tokenHash, codeHash } = mintLink(email);
  return { tokenHash, codeHash, code, address: `${new URL(env.APP_URL).origin}/open#${token}` };
}
