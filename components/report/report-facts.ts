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
