import 'server-only';
import { REPORT_LIMITS, stateProfile } from '@/lib/findings';
import type { InspectionFacts } from '@/lib/findings/facts';
import { RENDERER, type ReportSnapshot, type SnapshotFinding, type SnapshotPhoto } from '@/lib/schemas/snapshot';
import { decideFindings, type DecidedFinding } from './report-findings';
import { reportLog } from './report-log';
import type { ReportSources, Signer } from './report-sources';
import { addressLine } from './walk-rows';

/** What one release adds to the sources. */
export type Release = {
  reportVersionId: string;
  number: number;
  releasedAt: string;
  reason?: string;
  overrides: ReportSnapshot['overrides'];
};

/** Everything that the report of these sources says. Findings that were dismissed, or not yet decided, are left out. */
export function buildSnapshot(sources: ReportSources, release: Release): ReportSnapshot {
  const { facts, firm, evaluation, previous, signer } = sources;
  const photos = snapshotPhotos(sources);
  const stored = new Set(photos.map((photo) => photo.id));
  const findings = decideFindings(sources)
    .filter((row) => row.standing === 'kept' || row.standing === 'changed')
    .map((row, index) => snapshotFinding(row, index + 1, facts, stored));
  const offIds = new Set(evaluation.coverage.leftOff);
  return {
    schema: 1,
    renderer: RENDERER,
    ...release,
    ...(previous ? { supersedes: { id: previous.id, number: previous.number, sha256: previous.sha256 } } : {}),
    changes: [],
    firm: {
      name: firm.name,
      address: firm.address ? addressLine(firm.address) : '',
      phone: firm.phone ?? '',
      email: firm.email ?? '',
      licenseNumber: firm.licenseNumber ?? '',
      ...keyed('logo', firm.logoKey),
    },
    inspection: snapshotInspection(sources),
    stateProfile: snapshotProfile(sources),
    buyers: partiesOf(sources, 'buyer'),
    agents: partiesOf(sources, 'agent'),
    inspectors: sources.inspectors.map((row) => ({ ...licensed(row), name: row.name, leads: row.leads })),
    signature: {
      ...licensed(signer),
      name: signer.signatureName || signer.name,
      ...keyed('image', signer.signatureKey),
      signedAt: release.releasedAt,
    },
    coverage: snapshotCoverage(sources, offIds),
    findings,
    gaps: evaluation.gaps
      .filter((gap) => gap.kind !== 'not-tested')
      .map(({ id, kind, place, says }) => ({ id, kind, place, says: { en: says } })),
    log: reportLog(facts, findings),
    panels: facts.panels,
    circuits: snapshotCircuits(facts, offIds),
    notTested: evaluation.gaps
      .filter((gap) => gap.kind === 'not-tested')
      .map(({ place, says }) => ({ place, says: { en: says } })),
    photos,
    limits: { en: [...REPORT_LIMITS] },
  };
}

function snapshotFinding(
  { finding, signal, urgency, text }: DecidedFinding,
  number: number,
  facts: InspectionFacts,
  stored: Set<string>,
): SnapshotFinding {
  const receptacleIds = 'receptacleIds' in finding.subject ? finding.subject.receptacleIds : [];
  const circuitId = finding.subject.kind === 'circuit' ? finding.subject.circuitId : undefined;
  const isAbout = (row: { receptacleId?: string; circuitId?: string }) =>
    (row.receptacleId !== undefined && receptacleIds.includes(row.receptacleId)) ||
    (circuitId !== undefined && row.circuitId === circuitId);
  const isTold = finding.evidence.some((line) => line.instrument === 'Told');
  return {
    id: finding.id,
    code: finding.code,
    number,
    signal,
    urgency,
    who: finding.who,
    place: finding.place,
    receptacleIds,
    text: { en: text },
    evidence: finding.evidence.map(({ at, instrument, showed, by }) => ({ at, instrument, showed, by })),
    told: facts.notices
      .filter((notice) => !isTold && notice.kind === 'danger-told' && urgency === 'U1' && isAbout(notice))
      .map(({ at, whom = '', note }) => ({ at, whom, ...(note ? { note } : {}) })),
    photoIds: finding.photoIds.filter((id) => stored.has(id)),
    ...(finding.drawing ? { drawing: finding.drawing } : {}),
    ...(finding.hook ? { hook: finding.hook } : {}),
  };
}

function snapshotInspection({ inspection, facts, state }: ReportSources): ReportSnapshot['inspection'] {
  const { address } = inspection;
  const times = state.readings.map((reading) => reading.recordedAt).sort();
  const [first] = times;
  const last = times.at(-1);
  return {
    id: inspection.id,
    number: inspection.number,
    street: [address.street, address.unit].filter(Boolean).join(', '),
    cityLine: `${address.city}, ${address.state} ${address.zip}`,
    ...(address.county ? { county: address.county } : {}),
    timeZone: inspection.timeZone,
    scheduledAt: inspection.scheduledAt.toISOString(),
    ...(first && last ? { walkedAt: { first, last } } : {}),
    yearBuilt: facts.inspection.yearBuilt,
    wiringMethod: facts.inspection.wiringMethod,
    serviceAmps: inspection.serviceAmps ?? undefined,
    occupied: inspection.occupied ?? undefined,
    utilitiesOn: inspection.utilitiesOn ?? undefined,
    codeEdition: facts.inspection.codeEdition,
    codeEditionSource: facts.inspection.codeEditionSource,
  };
}

function snapshotProfile({ inspection }: ReportSources): ReportSnapshot['stateProfile'] {
  const profile = stateProfile(inspection.stateProfile);
  const { pages, consent } = profile;
  const duties = [
    pages.licenseNumber ? 'The license number stands on every page.' : '',
    pages.addressOnEachPage ? 'The address of the house stands on every page.' : '',
    pages.clientName ? 'The report names the client.' : '',
    consent.note,
  ].filter(Boolean);
  return {
    code: profile.code,
    name: profile.name,
    duties: duties.map((says) => ({ says, section: profile.section })),
  };
}

function snapshotCoverage({ evaluation, facts }: ReportSources, offIds: Set<string>): ReportSnapshot['coverage'] {
  const structures = new Map(facts.structures.map((row) => [row.id, row.name]));
  const areas = evaluation.coverage.areas.map(({ areaId, present, tested, skipped }) => {
    const area = facts.areas.find((row) => row.id === areaId);
    const structure = structures.get(area?.structureId ?? '') ?? '';
    return { areaId, name: area?.name ?? '', structure, present, tested, skipped };
  });
  const sum = (key: 'present' | 'tested' | 'skipped') => areas.reduce((total, area) => total + area[key], 0);
  return {
    present: sum('present'),
    tested: sum('tested'),
    skipped: sum('skipped'),
    areas,
    leftOff: [...offIds].map((id) => placeOf(facts, id)).concat(handedOver(facts)),
  };
}

/** Points that were handed over as off: whoever reads the report must know. */
function handedOver(facts: InspectionFacts): string[] {
  return facts.notices
    .filter((notice) => notice.kind === 'handed-over')
    .map((notice) => {
      const place = placeOf(facts, notice.receptacleId ?? notice.circuitId ?? '');
      return [`${place}: handed over${notice.whom ? ` to ${notice.whom}` : ''}`, notice.note]
        .filter(Boolean)
        .join('. ');
    });
}

/** "Garage, bench left", or the breaker's position. */
function placeOf(facts: InspectionFacts, id: string): string {
  const receptacle = facts.receptacles.find((row) => row.id === id);
  const area = facts.areas.find((row) => row.id === receptacle?.areaId);
  if (receptacle && area) return `${area.name}, ${receptacle.label}`;
  const circuit = facts.circuits.find((row) => row.id === id);
  return circuit ? `Breaker ${circuit.breaker}` : '';
}

function snapshotCircuits(facts: InspectionFacts, offIds: Set<string>): ReportSnapshot['circuits'] {
  return facts.circuits.map(({ sharedNeutral: _shared, ...circuit }) => ({
    ...circuit,
    feeds: facts.receptacles
      .filter((row) => row.circuitId === circuit.id && row.presence === 'present')
      .map((row) => ({
        receptacleId: row.id,
        place: placeOf(facts, row.id),
        pattern: row.pattern,
        device: row.device,
        fedFromReceptacleId: row.fedFromReceptacleId,
        off: offIds.has(row.id) || offIds.has(circuit.id),
      })),
  }));
}

/** Photos whose bytes are stored, numbered in their order. */
function snapshotPhotos({ photos, facts }: ReportSources): SnapshotPhoto[] {
  return photos
    .filter((row) => row.state === 'stored')
    .flatMap((row, index) => {
      if (!row.sha256Of1600) return [];
      const area = facts.areas.find((candidate) => candidate.id === row.areaId)?.name ?? '';
      return [
        {
          id: row.id,
          number: index + 1,
          key: `firm/${row.firmId}/photo/${row.id}/1600`,
          sha256: row.sha256,
          sha256Of1600: row.sha256Of1600,
          width: row.width ?? undefined,
          height: row.height ?? undefined,
          caption: row.caption,
          takenAt: row.takenAt?.toISOString(),
          place: placeOf(facts, row.receptacleId ?? row.circuitId ?? '') || area,
          receptacleId: row.receptacleId ?? undefined,
        },
      ];
    });
}

function partiesOf({ parties }: ReportSources, kind: 'buyer' | 'agent'): ReportSnapshot['buyers'] {
  return parties
    .filter((party) => party.kind === kind)
    .map(({ name, email, phone }) => ({ name, ...(email ? { email } : {}), ...(phone ? { phone } : {}) }));
}

function licensed({ membershipId, licenseNumber, licenseState }: Signer) {
  return {
    membershipId,
    ...(licenseNumber ? { licenseNumber } : {}),
    ...(licenseState ? { licenseState } : {}),
  };
}

/** A stored picture by its key, which ends in the SHA-256 of its bytes. */
function keyed<Name extends string>(name: Name, key: string | null) {
  const sha256 = key ? /[0-9a-f]{64}$/.exec(key)?.[0] : undefined;
  return (key && sha256 ? { [name]: { key, sha256 } } : {}) as { [Key in Name]?: { key: string; sha256: string } };
}
