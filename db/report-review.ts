import 'server-only';
import { findForbiddenWords, readingGrade, stateProfile } from '@/lib/findings';
import { unprintableLetters } from '@/lib/schemas/printable-letters';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';
import type { DecidedFinding } from './report-findings';
import type { ReportSources } from './report-sources';

export const REVIEW_CODES = [
  'nothing-inspected',
  'coverage',
  'still-off',
  'conflict',
  'field-conflict',
  'not-told',
  'undecided',
  'changed',
  'dismissed-without-reason',
  'caution-part',
  'forbidden-words',
  'reading-grade',
  'license',
  'letters',
  'photos',
  'buyer',
  'signature',
] as const;
export type ReviewCode = (typeof REVIEW_CODES)[number];

/** One thing that holds the release. `to` names the screen where it is put right, `at` the row there. */
export type ReviewLine = {
  code: ReviewCode;
  /** What is wrong, in a sentence. */
  says: string;
  detail: string;
  to: 'walk' | 'findings' | 'visit' | 'circuits' | 'firm' | 'me';
  at?: string;
  /** May be released all the same, with a reason that is kept and printed. */
  overridable: boolean;
};

/** The summary is for everybody; a finding's text may ask a little more (facts.md section 9). */
const MOST_SUMMARY_GRADE = 8;
const MOST_FINDING_GRADE = 10;

/** Everything that holds the release of these sources, in the order in which a person would put it right. */
export function reviewSources(sources: ReportSources, decided: DecidedFinding[], draft: ReportSnapshot): ReviewLine[] {
  return [
    ...coverageLines(sources),
    ...gapLines(sources),
    ...conflictLines(sources),
    ...decisionLines(decided),
    ...wordLines(decided.filter((row) => row.standing !== 'dismissed')),
    ...recordLines(sources),
    ...letterLines(draft),
  ];
}

const line = (
  code: ReviewCode,
  to: ReviewLine['to'],
  says: string,
  detail: string,
  more: { at?: string; overridable?: boolean } = {},
): ReviewLine => ({ code, to, says, detail, overridable: false, ...more });

function coverageLines({ evaluation, facts }: ReportSources): ReviewLine[] {
  if (facts.receptacles.length === 0)
    return [
      line('nothing-inspected', 'walk', 'Nothing was inspected yet', 'Log the receptacles, or say why there are none.'),
    ];
  return evaluation.coverage.areas
    .filter((area) => area.needs.length > 0)
    .map((area) => {
      const name = facts.areas.find((row) => row.id === area.areaId)?.name ?? 'An area';
      return line('coverage', 'walk', `${name} is not complete`, sentences(area.needs), { at: area.areaId });
    });
}

function gapLines({ evaluation }: ReportSources): ReviewLine[] {
  return evaluation.gaps.flatMap(({ kind, place, says, receptacleId }) => {
    if (kind === 'still-off') return [line('still-off', 'walk', `${place} is still off`, says, { at: receptacleId })];
    if (kind === 'conflict')
      return [line('conflict', 'walk', `Two readings disagree at ${place}`, says, { at: receptacleId })];
    if (kind === 'not-told')
      return [line('not-told', 'walk', `Nobody was told of ${place}`, says, { at: receptacleId })];
    return [];
  });
}

function conflictLines({ state }: ReportSources): ReviewLine[] {
  return state.conflicts.map((conflict) =>
    line(
      'field-conflict',
      'visit',
      `Two values wait for ${conflict.field}`,
      'Two people changed the same field. Choose which one stands.',
      { at: conflict.id },
    ),
  );
}

function decisionLines(decided: DecidedFinding[]): ReviewLine[] {
  return decided.flatMap(({ finding, standing, decision, text }) => {
    const says = `${finding.place}: ${text.title}`;
    const at = finding.id;
    if (standing === 'undecided')
      return [line('undecided', 'findings', `${says} is not decided`, 'Keep it, or dismiss it with a reason.', { at })];
    if (standing === 'changed')
      return [
        line('changed', 'findings', `${says} changed since you decided`, 'Look at the new evidence and decide again.', {
          at,
        }),
      ];
    if (standing === 'dismissed' && !decision?.reason)
      return [
        line('dismissed-without-reason', 'findings', `${says} was dismissed without a reason`, 'Say why.', { at }),
      ];
    return [];
  });
}

function wordLines(decided: DecidedFinding[]): ReviewLine[] {
  return decided.flatMap(({ finding, decision, text }) => {
    const own = [decision?.ownWords?.observed, decision?.ownWords?.plain].filter(Boolean).join(' ');
    const forbidden = findForbiddenWords(own);
    const { type, consequence, avoid } = text.hazard;
    const at = finding.id;
    const lines: ReviewLine[] = [];
    if ([type, consequence, avoid, text.who].some((part) => part.trim() === ''))
      lines.push(
        line('caution-part', 'findings', `The caution of ${finding.place} has an empty part`, 'Write all four parts.', {
          at,
        }),
      );
    if (forbidden.length > 0)
      lines.push(
        line(
          'forbidden-words',
          'findings',
          `Your words on ${finding.place} say what the reading cannot`,
          `Leave out: ${[...new Set(forbidden.map(({ word }) => word))].join(', ')}.`,
          { at },
        ),
      );
    return [...lines, ...gradeLines(text, finding.place, at)];
  });
}

function gradeLines(text: DecidedFinding['text'], place: string, at: string): ReviewLine[] {
  const summary = readingGrade(text.plain);
  const full = readingGrade(`${text.observed} ${text.means}`);
  const tooHard = [
    summary > MOST_SUMMARY_GRADE ? `The summary reads at grade ${summary.toFixed(1)}; the aim is 8.` : '',
    full > MOST_FINDING_GRADE ? `The finding reads at grade ${full.toFixed(1)}; the aim is 10.` : '',
  ].filter(Boolean);
  if (tooHard.length === 0) return [];
  const detail = `${tooHard.join(' ')} Shorter sentences and words help.`;
  return [
    line('reading-grade', 'findings', `The words on ${place} are hard to read`, detail, { at, overridable: true }),
  ];
}

function recordLines(sources: ReportSources): ReviewLine[] {
  const { inspection, signer, photos, parties, firm } = sources;
  const lines: ReviewLine[] = [];
  const waiting = photos.filter((photo) => photo.state !== 'stored');
  if (waiting.length > 0)
    lines.push(
      line(
        'photos',
        'walk',
        waiting.length === 1 ? 'A photo has not arrived' : `${waiting.length} photos have not arrived`,
        'Open the inspection on the phone that took them, or remove them. A report prints only photos that are stored.',
        { overridable: true },
      ),
    );
  if (!parties.some((party) => party.kind === 'buyer'))
    lines.push(line('buyer', 'visit', 'The report has no buyer', 'Add the person it is made for.'));
  if (!signer.signatureName)
    lines.push(line('signature', 'me', 'Your signature is missing', 'Type your name as you sign.'));
  const { pages } = stateProfile(inspection.stateProfile);
  if (pages.licenseNumber && !signer.licenseNumber)
    lines.push(
      line('license', 'me', 'Your license number is missing', `${stateName(sources)} wants it on the report.`, {
        overridable: inspection.stateProfile === 'general',
      }),
    );
  if (pages.sponsorLicense && !firm.licenseNumber)
    lines.push(
      line('license', 'firm', 'The firm’s license number is missing', `${stateName(sources)} wants it on the report.`),
    );
  return lines;
}

function stateName({ inspection }: ReportSources): string {
  return stateProfile(inspection.stateProfile).name;
}

function letterLines(draft: ReportSnapshot): ReviewLine[] {
  const lacking = unprintableLetters(textsOf(draft).join('\n'));
  if (lacking.length === 0) return [];
  return [
    line(
      'letters',
      'visit',
      'Some letters cannot be printed',
      `The report’s fonts lack ${lacking.slice(0, 12).join(' ')}. Write them another way, or release and they print as an empty box.`,
      { overridable: true },
    ),
  ];
}

function textsOf(value: unknown): string[] {
  if (typeof value === 'string') return [value];
  return value && typeof value === 'object' ? Object.values(value).flatMap(textsOf) : [];
}

function sentences(needs: string[]): string {
  return needs.map((need) => `${need}.`).join(' ');
}
