import { createHash } from 'node:crypto';
import { v7 as uuidv7 } from 'uuid';
import { describe, expect, test } from 'vitest';
import { listAudit } from '@/db/audit';
import { findReportFile, recordReportFile, retryRender } from '@/db/report-files';
import { findVersion, listVersions, releaseReport, reviewInspection } from '@/db/reports';
import { canonicalJson } from '@/lib/schemas/snapshot';
import { createFirm } from '../support/firm';
import { asOwner } from '../support/owner';
import { addReceptacle, keepAll, lampsAt, readyToRelease, sign } from '../support/report';

const codes = (lines: { code: string }[]) => [...new Set(lines.map((line) => line.code))];

describe('what holds a release', () => {
  test('an inspection without a receptacle is not released', async () => {
    const { inspector, inspection } = await createFirm();
    const outcome = await releaseReport(inspector, inspection.id);
    expect(outcome.kind === 'held' && codes(outcome.lines)).toContain('nothing-inspected');
  });

  test('a finding that nobody decided, and one whose evidence changed since, hold it', async () => {
    const ready = await readyToRelease();
    const { firm, phone, receptacleId } = ready;
    await phone.put(lampsAt(firm, receptacleId, 'off'));
    const changed = await releaseReport(firm.inspector, firm.inspection.id);
    expect(changed.kind === 'held' && codes(changed.lines)).toEqual(['changed']);
    await addReceptacle(ready, 'not read', 'unread');
    const more = await releaseReport(firm.inspector, firm.inspection.id);
    expect(more.kind === 'held' && codes(more.lines)).toContain('coverage');
  });

  test('the signature is the signer’s own, and its absence holds the release', async () => {
    const { firm } = await readyToRelease();
    const outcome = await releaseReport(firm.actor, firm.inspection.id);
    expect(outcome.kind === 'held' && codes(outcome.lines)).toEqual(['signature', 'license']);
  });

  test('words that a reading cannot prove hold it, and cannot be overridden', async () => {
    const { firm, phone } = await readyToRelease();
    const review = await reviewInspection(firm.inspector, firm.inspection.id);
    const finding = review?.findings[0]?.finding;
    if (!finding) throw new Error('no finding');
    const own = { findingId: finding.id, decision: 'kept', sawReadingIds: finding.readingIds } as const;
    await phone.put({
      op: 'finding.decide',
      id: uuidv7(),
      ...own,
      ownWords: { observed: 'The rest of the room passed.' },
    });
    const overrides = { 'forbidden-words': 'because' };
    const outcome = await releaseReport(firm.inspector, firm.inspection.id, { overrides });
    expect(outcome.kind === 'held' && codes(outcome.lines)).toContain('forbidden-words');
  });

  test('a photo that has not arrived holds it unless a reason is given, which the report keeps', async () => {
    const { firm, phone, receptacleId } = await readyToRelease();
    await phone.put({
      op: 'photo.add',
      id: uuidv7(),
      receptacleId,
      sha256: 'c'.repeat(64),
      bytes: 1000,
      type: 'image/jpeg',
      order: 1,
    });
    const held = await releaseReport(firm.inspector, firm.inspection.id);
    expect(held.kind === 'held' && codes(held.lines)).toEqual(['photos']);
    const overrides = { photos: 'The phone was lost.' };
    const outcome = await releaseReport(firm.inspector, firm.inspection.id, { overrides });
    if (outcome.kind !== 'released') throw new Error(outcome.kind);
    const version = await findVersion(firm.inspector, outcome.reportVersionId);
    expect(version?.snapshot.overrides.map((row) => row.reason)).toEqual(['The phone was lost.']);
  });

  test('letters that the fonts lack are named', async () => {
    const { firm } = await readyToRelease();
    await sign(firm, 'Инес Cole');
    const outcome = await releaseReport(firm.inspector, firm.inspection.id);
    expect(outcome.kind === 'held' && outcome.lines[0]?.detail).toContain('И н е с');
  });
});

describe('a release', () => {
  test('freezes what the report says, under the hash of its own text', async () => {
    const { firm } = await readyToRelease();
    const outcome = await releaseReport(firm.inspector, firm.inspection.id);
    if (outcome.kind !== 'released') throw new Error(outcome.kind);
    const [row] = await asOwner('select snapshot, sha256 from report_versions where id = $1', [
      outcome.reportVersionId,
    ]);
    expect(createHash('sha256').update(String(row?.snapshot)).digest('hex')).toBe(row?.sha256);

    const version = await findVersion(firm.inspector, outcome.reportVersionId);
    expect(canonicalJson(version?.snapshot)).toBe(row?.snapshot);
    expect(version?.snapshot.findings.map((finding) => finding.place)).toContain('Living room, by the door');
    expect(version?.snapshot.log.map((line) => line.label)).toEqual(['by the door', 'by the window']);
    const [listed] = await listVersions(firm.inspector, firm.inspection.id);
    expect(listed).toMatchObject({ number: 1, render: { state: 'waiting' }, file: null });
    const audit = await listAudit(firm.inspector, firm.inspection.id);
    expect(audit.at(-1)).toMatchObject({ kind: 'report.released', detail: { number: 1, sha256: row?.sha256 } });
  });

  test('asks for its PDF in the same transaction, in the worker’s queue', async () => {
    const { firm } = await readyToRelease();
    const outcome = await releaseReport(firm.inspector, firm.inspection.id);
    if (outcome.kind !== 'released') throw new Error(outcome.kind);
    const key = `render:${outcome.reportVersionId}:en`;
    const jobs = await asOwner('select task_identifier from graphile_worker.jobs where key = $1', [key]);
    expect(jobs).toEqual([{ task_identifier: 'render-report' }]);
  });

  test('a second one without a change says so, and with a change asks why', async () => {
    const ready = await readyToRelease();
    const { inspector, inspection } = ready.firm;
    await releaseReport(inspector, inspection.id);
    expect(await releaseReport(inspector, inspection.id)).toEqual({ kind: 'nothing-changed', number: 1 });

    await addReceptacle(ready, 'behind the sofa', 'lit');
    await keepAll(ready);
    expect(await releaseReport(inspector, inspection.id)).toEqual({ kind: 'reason-needed', number: 2 });
    const outcome = await releaseReport(inspector, inspection.id, { reason: 'One more receptacle was reached.' });
    if (outcome.kind !== 'released') throw new Error(outcome.kind);
    const version = await findVersion(inspector, outcome.reportVersionId);
    expect(version?.snapshot).toMatchObject({ number: 2, supersedes: { number: 1 } });
    expect(version?.snapshot.changes).toContain('The log of receptacles changed.');
  });

  test('of eight pressed at the same moment one is released and the others find nothing changed', async () => {
    const { firm } = await readyToRelease();
    const press = () => releaseReport(firm.inspector, firm.inspection.id, { reason: 'Again.' });
    const outcomes = await Promise.all(Array.from({ length: 8 }, press));
    expect(outcomes.map((outcome) => outcome.kind).toSorted()).toEqual([
      ...Array.from({ length: 7 }, () => 'nothing-changed'),
      'released',
    ]);
  });

  test('is the inspector’s alone: not the office’s, not a colleague’s, not another firm’s', async () => {
    const { firm } = await readyToRelease();
    const stranger = await createFirm();
    const release = (actor: typeof firm.office) => releaseReport(actor, firm.inspection.id);
    expect(await release(firm.office)).toEqual({ kind: 'not-allowed' });
    expect(await release(firm.colleague)).toEqual({ kind: 'not-found' });
    expect(await release(stranger.actor)).toEqual({ kind: 'not-found' });
  });

  test('a released version is changed by nobody, its owner included', async () => {
    const { firm } = await readyToRelease();
    const outcome = await releaseReport(firm.inspector, firm.inspection.id);
    if (outcome.kind !== 'released') throw new Error(outcome.kind);
    const change = asOwner(`update report_versions set snapshot = '{}' where id = $1`, [outcome.reportVersionId]);
    await expect(change).rejects.toThrow('never changed');
  });
});

test('a PDF is recorded once, found by those who may, and not asked for again', async () => {
  const { firm } = await readyToRelease();
  const outcome = await releaseReport(firm.inspector, firm.inspection.id);
  if (outcome.kind !== 'released') throw new Error(outcome.kind);
  const { reportVersionId } = outcome;
  expect(await retryRender(firm.office, reportVersionId)).toEqual({ kind: 'asked' });

  const worker = { kind: 'system', firmId: firm.firmId, task: 'render-report' } as const;
  const file = { locale: 'en', renderer: 'r', key: 'k', bytes: 1, pages: 1, sha256: 'd'.repeat(64) } as const;
  await recordReportFile(worker, { reportVersionId, ...file });
  await recordReportFile(worker, { reportVersionId, ...file });
  const stranger = await createFirm();
  expect(await findReportFile(firm.office, reportVersionId, 'en')).toMatchObject({ key: 'k', number: 1 });
  expect(await findReportFile(firm.colleague, reportVersionId, 'en')).toBeNull();
  expect(await findReportFile(stranger.actor, reportVersionId, 'en')).toBeNull();
  expect(await retryRender(firm.office, reportVersionId)).toEqual({ kind: 'already-there' });
  const [listed] = await listVersions(firm.inspector, firm.inspection.id);
  expect(listed).toMatchObject({ render: { state: 'ready' }, file: { pages: 1 } });
});
