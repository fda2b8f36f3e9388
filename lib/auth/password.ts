import 'server-only';
import { hash, verify, type Options } from '@node-rs/argon2';
import commonPasswords from './common-passwords.json';

/** Argon2id, the package's default algorithm. 64 MiB and five passes take over 100 ms of one core. */
const COST: Options = { memoryCost: 65_536, timeCost: 5, parallelism: 1 };
export const PASSWORD_MIN_LENGTH = 12;
const PASSWORD_MAX_LENGTH = 200;

/** Checked when no account answers to an e-mail, so that an unknown one takes as long as a wrong password. */
const NOBODY = hash('no account answers to this', COST);

const COMMON = new Set(commonPasswords);
const WALKS = [
  'qwertyuiop[]',
  'asdfghjkl;',
  'zxcvbnm,./',
  '1234567890-=',
  'abcdefghijklmnopqrstuvwxyz',
  'qazwsxedcrfvtgb',
];

export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFKC'), COST);
}

export async function isPasswordOf(passwordHash: string | null, password: string): Promise<boolean> {
  const given = password.slice(0, PASSWORD_MAX_LENGTH).normalize('NFKC');
  const matches = await verify(passwordHash ?? (await NOBODY), given);
  return passwordHash !== null && matches;
}

/** What is wrong with a new password in the reader's words, or null. `about` is what others know: e-mail, names, firm. */
export function refusePassword(password: string, about: string[]): string | null {
  const plain = password.normalize('NFKC').toLowerCase();
  if (plain.length < PASSWORD_MIN_LENGTH)
    return `Use at least ${PASSWORD_MIN_LENGTH} characters. Three or four plain words do well.`;
  if (plain.length > PASSWORD_MAX_LENGTH) return `Use at most ${PASSWORD_MAX_LENGTH} characters.`;
  if (isCommon(plain))
    return 'That password is on lists that thieves try first. Choose words that do not belong together.';
  if (isMostly(plain, about))
    return 'That password is mostly your own name, e-mail or firm. Choose words that others would not guess.';
  return null;
}

function isCommon(plain: string): boolean {
  const bare = plain.replace(/[^\p{L}\p{N}]/gu, '');
  // "Summer2026!!" is the word and what people hang on to reach the length.
  const core = bare.replace(/^\p{N}+|\p{N}+$/gu, '');
  if ([plain, bare, core].some((text) => COMMON.has(text))) return true;
  if (new Set(bare).size < 5) return true;
  return [bare, core].some((text) => isRepeat(text) || isWalk(text) || text.length < 8);
}

function isRepeat(text: string): boolean {
  return text.length >= 4 && `${text}${text}`.indexOf(text, 1) < text.length;
}

/** Keys that lie next to each other, forward or back, in runs of four or more. */
function isWalk(text: string): boolean {
  let left = text;
  for (const row of WALKS.flatMap((walk) => [walk, [...walk].reverse().join('')])) {
    for (let length = row.length; length >= 4; length -= 1) {
      for (let start = 0; start + length <= row.length; start += 1)
        left = left.replaceAll(row.slice(start, start + length), '');
    }
  }
  return left.length < 4;
}

function isMostly(plain: string, about: string[]): boolean {
  let left = plain.replace(/[^\p{L}\p{N}]/gu, '');
  const parts = about.flatMap((text) =>
    text
      .normalize('NFKC')
      .toLowerCase()
      .split(/[^\p{L}\p{N}]+/u),
  );
  for (const part of parts.filter((text) => text.length >= 4)) left = left.replaceAll(part, '');
  return left.length < 5;
}
