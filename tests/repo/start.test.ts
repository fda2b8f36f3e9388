import { expect, test } from 'vitest';
import { planStart } from '../../scripts/settings.mjs';

const OUTSIDE = {
  DATABASE_URL: 'postgres://ohmstead_app:x@db.example/ohmstead',
  DATABASE_OWNER_URL: 'postgres://ohmstead_owner:x@db.example/ohmstead',
  DATABASE_JOBS_URL: 'postgres://ohmstead_jobs:x@db.example/ohmstead',
  APP_URL: 'https://reports.example',
  SMTP_URL: 'smtps://mail.example',
  AUTH_SECRET: 'a secret that is long enough for this',
};

test('with nothing set, the program runs on its own database and is open to this machine alone', () => {
  expect(planStart({})).toMatchObject({ isPrivate: true, isLocal: true, host: '127.0.0.1', port: null });
});

test('the demo and the fakes never run beside a database named from outside, even on loopback', () => {
  expect(planStart(OUTSIDE)).toMatchObject({ isPrivate: false, isLocal: false });
  expect(planStart({ ...OUTSIDE, APP_URL: 'http://127.0.0.1:3000', DEMO: '1' })).toMatchObject({ isLocal: false });
});

test('the demo never runs where others than this machine can reach the program', () => {
  const mail = { SMTP_URL: OUTSIDE.SMTP_URL };
  expect(planStart({ ...mail, APP_URL: 'https://reports.example' }).isLocal).toBe(false);
  expect(planStart({ ...mail, APP_URL: 'http://127.0.0.1:3000', HOST: '0.0.0.0' }).isLocal).toBe(false);
  expect(planStart({ ...mail, APP_URL: 'http://127.0.0.1.reports.example' }).isLocal).toBe(false);
});

test.each(['APP_URL', 'SMTP_URL', 'AUTH_SECRET', 'DATABASE_OWNER_URL', 'DATABASE_JOBS_URL'])(
  'on services of one’s own, a missing %s stops the start with a sentence that names it',
  (name) => {
    expect(() => planStart({ ...OUTSIDE, [name]: '' })).toThrow(name);
  },
);

test('a loopback address with a port is the port that the web takes', () => {
  expect(planStart({ APP_URL: 'http://localhost:4010' }).port).toBe(4010);
  expect(planStart({ APP_URL: 'http://localhost:4010', PORT: '4011' }).port).toBe(4011);
});

test.each([{ PORT: 'http' }, { PORT: '70000' }, { APP_URL: 'reports.example' }])(
  '%o is refused with a sentence',
  (given) => {
    expect(() => planStart(given)).toThrow(/^(PORT|APP_URL) is "/);
  },
);
