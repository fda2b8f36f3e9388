import { expect, test } from 'vitest';
import type { Finding } from '@/lib/findings/facts';
import { decideFindings } from '@/lib/schemas/decided';
import type { WalkDecision } from '@/lib/schemas/walk';

const finding: Finding = {
  id: 'W01:bedroom',
  code: 'W01',
  signal: 'WARNING',
  urgency: 'U2',
  who: 'electrician',
  subject: { kind: 'receptacles', receptacleIds: ['r1'] },
  place: 'Bedroom 1',
  readingIds: ['a', 'b'],
  photoIds: [],
  values: {},
  evidence: [],
  unproven: ['The wall was not opened.'],
};

function decision(order: number, part: Partial<WalkDecision> = {}): WalkDecision {
  return {
    id: `d${order}`,
    findingId: finding.id,
    decision: 'kept',
    sawReadingIds: ['b', 'a'],
    order,
    by: 'T. Brandt',
    at: '2026-12-01T15:00:00Z',
    ...part,
  };
}

const standingOf = (decisions: WalkDecision[]) => decideFindings([finding], decisions)[0]?.standing;

test('a finding that nobody decided waits', () => {
  expect(standingOf([])).toBe('to-decide');
});

test('a decision holds for the readings it saw, in any order', () => {
  expect(standingOf([decision(1)])).toBe('kept');
});

test('one more reading marks the decision as changed', () => {
  expect(standingOf([decision(1, { sawReadingIds: ['a'] })])).toBe('changed');
});

test('a reading that is gone marks the decision as changed', () => {
  expect(standingOf([decision(1, { sawReadingIds: ['a', 'b', 'c'] })])).toBe('changed');
});

test('the last decision by the server’s order stands, however the list is sorted', () => {
  expect(standingOf([decision(9, { decision: 'dismissed' }), decision(3)])).toBe('dismissed');
});

test('a signal is raised and never lowered', () => {
  const signalOf = (raisedSignal: WalkDecision['raisedSignal']) =>
    decideFindings([finding], [decision(1, { raisedSignal })])[0]?.signal;
  expect(signalOf('DANGER')).toBe('DANGER');
  expect(signalOf('NOTICE')).toBe('WARNING');
});
