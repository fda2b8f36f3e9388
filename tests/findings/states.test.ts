import { expect, test } from 'vitest';
import { checkCoverage } from '@/lib/findings';
import { STATE_PROFILES } from '@/lib/findings/vocabulary';
import { STATE_RULES, stateProfile } from '@/lib/findings/states/all';
import { area, emptyHouse, lamps, receptacle, readings } from '../support/facts';

test('every state profile names its section and sends the reader to the regulator', () => {
  for (const code of STATE_PROFILES) {
    const profile = stateProfile(code);
    expect(profile.code).toBe(code);
    expect(profile.section).not.toBe('');
    expect(profile.confirm).toContain('regulator');
    expect(profile.retention.years).toBeGreaterThan(0);
  }
  expect(Object.keys(STATE_RULES).toSorted()).toEqual([...STATE_PROFILES].toSorted());
});

test('report deadlines are those of the state rules (facts section 7)', () => {
  // NY: Real Property Law 444-g and the code of ethics. TX: 22 TAC 535.222.
  expect(stateProfile('NY').reportDeadline).toMatchObject({ amount: 5, unit: 'business-days' });
  expect(stateProfile('TX').reportDeadline).toMatchObject({ amount: 2, unit: 'days', mayAgreeOtherwise: true });
  expect(stateProfile('TX').pages).toMatchObject({ addressOnEachPage: true, sponsorLicense: true });
  // NJ: N.J.A.C. 13:40-15.15. IL: 68 Ill. Adm. Code 1410.240.
  expect(stateProfile('NJ')).toMatchObject({
    agreement: { sendWithinBusinessDays: 1 },
    retention: { years: 5, stated: true },
  });
  expect(stateProfile('IL').retention).toMatchObject({ years: 5, stated: true });
  expect(stateProfile('general').retention).toMatchObject({ years: 5, stated: false });
});

test('North Carolina takes no sample for garages, exteriors and receptacles near plumbing', () => {
  const facts = (stateCode: 'NC' | 'NY') =>
    emptyHouse({
      inspection: { stateProfile: stateCode },
      areas: [area({ id: 'garage', name: 'Garage', place: 'garage' })],
      receptacles: [
        receptacle({ id: 'a', areaId: 'garage', order: 1 }),
        receptacle({ id: 'b', areaId: 'garage', order: 2 }),
      ],
      readings: readings([{ kind: 'wiring', receptacleId: 'a', evidence: { lamps: lamps('110') } }]),
      skips: [{ id: 's', receptacleId: 'b', reason: 'representative-sample' }],
    });
  expect(checkCoverage(facts('NY')).complete).toBe(true);
  expect(checkCoverage(facts('NC')).areas[0]?.needs.join()).toContain('a sample is not enough');
});
