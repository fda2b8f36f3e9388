import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Stop } from './say.mjs';

/** The secrets of a private cluster, made once and kept in a file that only its owner can read. */
export function loadSecrets(home) {
  const file = path.join(home, 'secrets.json');
  if (existsSync(file)) return readSecrets(file, home);
  if (existsSync(path.join(home, 'data'))) {
    throw new Stop(
      `${file} is missing and the database beside it opens with it alone: put it back, or move ${home} away to begin anew.`,
    );
  }
  const secrets = {
    databasePassword: randomBytes(24).toString('hex'),
    ownerPassword: randomBytes(24).toString('hex'),
    appPassword: randomBytes(24).toString('hex'),
    jobsPassword: randomBytes(24).toString('hex'),
    authSecret: randomBytes(32).toString('base64url'),
    actionsKey: randomBytes(32).toString('base64'),
    webhookSecret: `whsec_${randomBytes(24).toString('hex')}`,
  };
  writeWhole(file, secrets);
  return secrets;
}

/** Writes JSON so that a reader sees the old file or the new one, and nobody else either. */
export function writeWhole(file, value) {
  writeFileSync(`${file}.new`, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
}

export function readWhole(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch (error) {
    if (error.code === 'EACCES') throw error;
    return null;
  }
}

function readSecrets(file, home) {
  const secrets = readWhole(file);
  if (secrets?.databasePassword) return secrets;
  throw new Stop(`${file} cannot be read: put back a good copy, or move ${home} away to begin anew.`);
}
