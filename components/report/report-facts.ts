import { dateTimeIn } from '@/lib/messages/dates';
import type { ReportMessages } from '@/lib/messages/en-report';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';

/** Term and value, as the cover and the web report list them. */
export function coverFacts(snapshot: ReportSnapshot, messages: ReportMessages): [string, string][] {
  const { cover, license } = messages;
  const { inspection, coverage } = snapshot;
  const inspectors = snapshot.inspectors.map(({ name, licenseNumber }) =>
    licenseNumber ? `${name}, ${license(licenseNumber)}` : name,
  );
  const version = cover.versionLine(snapshot.number, dateTimeIn(inspection.timeZone, snapshot.releasedAt));
  const replaces = snapshot.supersedes ? ` ${cover.replaces(snapshot.supersedes.number)}` : '';
  const facts: [string, string][] = [
    [cover.for, snapshot.buyers.map((buyer) => buyer.name).join(', ')],
    [cover.agent, snapshot.agents.map((agent) => agent.name).join(', ')],
    [cover.inspectedBy, inspectors.join('; ')],
    [cover.visited, visited(snapshot)],
    [cover.house, houseLine(snapshot, messages)],
    [
      cover.edition,
      inspection.codeEdition
        ? cover.editionLine(inspection.codeEdition, inspection.codeEditionSource ?? '')
        : cover.editionUnknown,
    ],
    [cover.tested, cover.testedLine(coverage.tested, coverage.present)],
    [cover.version, version + replaces],
  ];
  return facts.filter(([, value]) => value !== '');
}

function houseLine({ inspection }: ReportSnapshot, messages: ReportMessages): string {
  const built = inspection.yearBuilt ? messages.cover.built(inspection.yearBuilt) : messages.cover.builtUnknown;
  const service = inspection.serviceAmps ? messages.cover.service(inspection.serviceAmps) : '';
  return [built, messages.wiring[inspection.wiringMethod], service].filter(Boolean).join(' ');
}

function visited({ inspection }: ReportSnapshot): string {
  return dateTimeIn(inspection.timeZone, inspection.walkedAt?.first ?? inspection.scheduledAt);
}

/** A hash in groups of four, so that a person can compare it and the line can break. */
export function grouped(sha256: string): string {
  return sha256.replaceAll(/(.{4})(?=.)/g, '$1 ');
}

/** Where and what, in one line. Abbreviations such as GFCI keep their capitals. */
export function headline({ place }: { place: string }, title: string): string {
  const isWord = /^[A-Z][a-z]/.test(title);
  return `${place}: ${isWord ? title.charAt(0).toLowerCase() + title.slice(1) : title}`;
}

/** The place of a finding within the page. */
export function anchorOf({ number }: { number: number }): string {
  return `finding-${number}`;
}

/** Version, reasons, state profile and hash, as the end of the report lists them. */
export function signatureFacts(
  snapshot: ReportSnapshot,
  sha256: string,
  { signature: words, cover }: ReportMessages,
): [string, string][] {
  const { stateProfile, inspection, overrides } = snapshot;
  const duties = stateProfile.duties.map(({ says }) => says).join(' ');
  const section = stateProfile.duties[0]?.section ?? '';
  const facts: [string, string][] = [
    [words.version, cover.versionLine(snapshot.number, dateTimeIn(inspection.timeZone, snapshot.releasedAt))],
    [words.reason, snapshot.reason ?? ''],
    [words.changes, snapshot.changes.join(' ')],
    [words.overrides, overrides.map(({ says, reason }) => `${says}: ${reason}`).join(' ')],
    [words.profile(stateProfile.name), duties && `${duties} (${section}) ${words.confirm}`],
    [words.renderer, snapshot.renderer],
    [cover.hash, grouped(sha256)],
  ];
  return facts.filter(([, value]) => value !== '');
}
