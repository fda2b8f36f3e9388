import { createHash } from 'node:crypto';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { simpleParser, type ParsedMail } from 'mailparser';
import { Pool } from 'pg';
import { SMTPServer } from 'smtp-server';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { VISITOR } from '@/db/actor';
import { listGrants, revokeGrant, sendReport } from '@/db/grants';
import { enqueueJob } from '@/db/jobs';
import { listParties } from '@/db/parties';
import { listVersions, releaseReport } from '@/db/reports';
import { withActor } from '@/db/with-actor';
import { freeDeadWorkers } from '@/lib/jobs/heartbeat';
import { renderReport } from '@/lib/jobs/render-report';
import { sendMail } from '@/lib/jobs/send-mail';
import { reportKey } from '@/lib/storage/keys';
import { readObject } from '@/lib/storage/storage';
import { createFirm } from '../support/firm';
import { asOwner } from '../support/owner';
import { readyToRelease } from '../support/report';

const ATTEMPT = { jobId: '1', isLast: false };
let answers: 'take' | 'refuse' | 'later' = 'take';
const mails: ParsedMail[] = [];
const server = new SMTPServer({
  authOptional: true,
  disabledCommands: ['STARTTLS'],
  onData(stream, _session, done) {
    void simpleParser(stream).then((mail) => {
      if (answers === 'take') mails.push(mail);
      const code = { take: 0, refuse: 550, later: 451 }[answers];
      done(code ? Object.assign(new Error('no'), { responseCode: code }) : null);
    });
  },
});

beforeAll(async () => {
  process.env.STORAGE_DIR = mkdtempSync(path.join(tmpdir(), 'ohmstead-store-'));
  process.env.APP_URL ??= 'http://127.0.0.1:3000';
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
  const address = server.server.address();
  process.env.SMTP_URL = `smtp://127.0.0.1:${typeof address === 'object' ? address?.port : ''}`;
});
afterAll(() => new Promise<void>((resolve) => server.close(() => resolve())));

async function released() {
  const ready = await readyToRelease();
  const outcome = await releaseReport(ready.firm.inspector, ready.firm.inspection.id);
  if (outcome.kind !== 'released') throw new Error(outcome.kind);
  return { ...ready, reportVersionId: outcome.reportVersionId };
}

async function reportMail() {
  const { firm, reportVersionId } = await released();
  const [buyer] = await listParties(firm.office, firm.inspection.id);
  const link = {
    tokenHash: hash(uuidv7()),
    codeHash: hash(uuidv7()),
    address: 'http://127.0.0.1/open#t',
    code: 'AB-CD',
  };
  const outcome = await sendReport(firm.office, firm.inspection.id, buyer?.id ?? '', () => link);
  if (outcome.kind !== 'sent') throw new Error(outcome.kind);
  const [message] = await asOwner('select id from messages where grant_id = $1', [outcome.grantId]);
  const messageId = String(message?.id);
  const job = { kind: 'report-ready', firmId: firm.firmId, messageId, link: link.address, code: link.code } as const;
  return { firm, job, messageId, grantId: outcome.grantId, reportVersionId };
}

const hash = (text: string) => createHash('sha256').update(text).digest();
const stateOf = async (messageId: string) =>
  (await asOwner('select state, failure from messages where id = $1', [messageId]))[0];

test('a job asked for in a transaction that fails is never run', async () => {
  const { actor, firmId } = await createFirm();
  const reportVersionId = uuidv7();
  const failing = withActor(actor, async (tx) => {
    await enqueueJob(tx, 'render-report', { firmId, reportVersionId, locale: 'en' }, { key: reportVersionId });
    throw new Error('rolled back');
  });
  await expect(failing).rejects.toThrow('rolled back');
  expect(await asOwner('select 1 from graphile_worker.jobs where key = $1', [reportVersionId])).toEqual([]);
});

test('nobody asks for a job of another firm', async () => {
  const [mine, other] = [await createFirm(), await createFirm()];
  const payload = { firmId: other.firmId, reportVersionId: uuidv7(), locale: 'en' } as const;
  const ask = (actor: Parameters<typeof withActor>[0]) =>
    withActor(actor, (tx) => enqueueJob(tx, 'render-report', payload));
  await expect(ask(mine.actor)).rejects.toThrow();
  await expect(ask(VISITOR)).rejects.toThrow();
});

test('the PDF of a version is stored once, and a second run changes nothing', { timeout: 120_000 }, async () => {
  const { firm, reportVersionId } = await released();
  const job = { firmId: firm.firmId, reportVersionId, locale: 'en' } as const;
  await renderReport(job, ATTEMPT);
  await renderReport(job, ATTEMPT);
  const [version] = await listVersions(firm.office, firm.inspection.id);
  const key = reportKey(firm.firmId, reportVersionId, 'en', 'ohmstead-pdf-1');
  const stored = await readObject(key);
  expect(stored?.subarray(0, 5).toString()).toBe('%PDF-');
  expect(version?.render.state).toBe('ready');
  expect(version?.file?.sha256).toBe(
    createHash('sha256')
      .update(stored ?? '')
      .digest('hex'),
  );
});

test('a PDF that cannot be made says why on the version’s line', async () => {
  const { firm, phone, receptacleId } = await readyToRelease();
  const photoId = uuidv7();
  const sha256 = 'c'.repeat(64);
  await phone.put({ op: 'photo.add', id: photoId, receptacleId, sha256, bytes: 9, type: 'image/jpeg', order: 1 });
  await asOwner(`update photos set state = 'stored', sha256_of1600 = $2 where id = $1`, [photoId, sha256]);
  const outcome = await releaseReport(firm.inspector, firm.inspection.id);
  if (outcome.kind !== 'released') throw new Error(outcome.kind);
  const job = { firmId: firm.firmId, reportVersionId: outcome.reportVersionId, locale: 'en' } as const;
  await expect(renderReport(job, { jobId: '1', isLast: true })).rejects.toThrow('Photo 1 is missing');
  const [version] = await listVersions(firm.office, firm.inspection.id);
  expect(version?.render).toEqual({ state: 'failed', failure: 'Photo 1 is missing in the store.' });
});

test('a version without a PDF for ten minutes is asked for again', async () => {
  const { reportVersionId } = await released();
  const key = `render:${reportVersionId}:en`;
  const owner = new Pool({ connectionString: process.env.DATABASE_OWNER_URL, max: 1 });
  const client = await owner.connect();
  // One transaction, so that a worker of this database cannot take the job before it is looked at.
  await client.query('begin');
  await client.query('delete from graphile_worker._private_jobs where key = $1', [key]);
  const late = `update renders set state = 'waiting', updated_at = now() - interval '11 minutes' where report_version_id = $1`;
  await client.query(late, [reportVersionId]);
  await client.query('select sweep_renders()');
  const { rowCount } = await client.query('select 1 from graphile_worker.jobs where key = $1', [key]);
  await client.query('rollback');
  client.release();
  await owner.end();
  expect(rowCount).toBe(1);
});

test('the jobs of a worker that died are freed, and those of a living one are not', async () => {
  const { firm, reportVersionId } = await released();
  const living = await released();
  const [dead, alive] = [`worker-${uuidv7()}`, `worker-${uuidv7()}`];
  const lock = (worker: string, id: string) =>
    asOwner(
      `update graphile_worker._private_jobs set locked_by = $1, locked_at = now() - interval '2 minutes' where key = $2`,
      [worker, `render:${id}:en`],
    );
  await lock(dead, reportVersionId);
  await lock(alive, living.reportVersionId);
  await asOwner('insert into worker_heartbeats (worker_id) values ($1)', [alive]);
  const jobs = new Pool({ connectionString: process.env.DATABASE_JOBS_URL, max: 1 });
  const freed = await freeDeadWorkers(jobs);
  await jobs.end();
  expect(firm.firmId).not.toBe(living.firm.firmId);
  expect(freed).toContain(dead);
  expect(freed).not.toContain(alive);
  const holder = (id: string) =>
    asOwner('select locked_by from graphile_worker.jobs where key = $1', [`render:${id}:en`]);
  expect(await holder(reportVersionId)).toEqual([{ locked_by: null }]);
  expect(await holder(living.reportVersionId)).toEqual([{ locked_by: alive }]);
});

test('the buyer’s mail says what to stop using now, in HTML and in text, with a link and a code', async () => {
  const { job, messageId } = await reportMail();
  answers = 'take';
  await sendMail(job, ATTEMPT);
  const mail = mails.find((one) => one.messageId?.includes(messageId));
  expect(await stateOf(messageId)).toMatchObject({ state: 'sent' });
  expect(mail?.subject).toContain('Your report on 41 Juniper Way');
  for (const body of [mail?.text, String(mail?.html)]) {
    expect(body).toContain('http://127.0.0.1/open#t');
    expect(body).toContain('AB-CD');
  }
});

test('a mail is not sent twice, and a repeat after a crash carries the same Message-ID', async () => {
  const { job, messageId } = await reportMail();
  answers = 'take';
  await sendMail(job, ATTEMPT);
  await sendMail(job, ATTEMPT);
  const count = () => mails.filter((one) => one.messageId === `<${messageId}@127.0.0.1>`).length;
  expect(count()).toBe(1);
  await asOwner(`update messages set state = 'sending' where id = $1`, [messageId]);
  await sendMail(job, ATTEMPT);
  expect(count()).toBe(2);
});

test('an address that is refused is not tried again; a server that is away is', async () => {
  const refused = await reportMail();
  answers = 'refuse';
  await sendMail(refused.job, ATTEMPT);
  expect(await stateOf(refused.messageId)).toMatchObject({ state: 'failed' });

  const later = await reportMail();
  answers = 'later';
  await expect(sendMail(later.job, ATTEMPT)).rejects.toThrow();
  expect(await stateOf(later.messageId)).toMatchObject({ state: 'waiting' });
  await expect(sendMail(later.job, { ...ATTEMPT, isLast: true })).rejects.toThrow();
  const [grant] = await listGrants(later.firm.office, later.firm.inspection.id);
  expect(grant?.mail?.state).toBe('failed');
});

test('a link that was revoked before its mail went out is not mailed', async () => {
  const { firm, job, messageId, grantId } = await reportMail();
  answers = 'take';
  await revokeGrant(firm.office, grantId);
  await sendMail(job, ATTEMPT);
  expect(mails.some((one) => one.messageId?.includes(messageId))).toBe(false);
  expect(await stateOf(messageId)).toMatchObject({ state: 'failed' });
});

test('an invitation is mailed with its link and its code', async () => {
  answers = 'take';
  const to = `${uuidv7()}@people.example`;
  const link = 'http://127.0.0.1/open#invited';
  await sendMail({ kind: 'invitation', to, name: 'Ada', firmName: 'Firm', link, code: 'QR-ST' }, ATTEMPT);
  const mail = mails.find((one) => JSON.stringify(one.to).includes(to));
  expect(mail?.text).toContain('Firm asks you to join');
  expect(mail?.text).toContain(link);
  expect(mail?.text).toContain('QR-ST');
});
