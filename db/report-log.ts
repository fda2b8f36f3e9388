import 'server-only';
import { bitsOf } from '@/lib/findings/evidence';
import type { InspectionFacts } from '@/lib/findings/facts';
import { buildWorld, compareText, type Point } from '@/lib/findings/points';
import { SKIP_WORDS } from '@/lib/findings/wording/skip-words';
import { en } from '@/lib/messages/en';
import type { SnapshotFinding, SnapshotLogRow } from '@/lib/schemas/snapshot';

/** The log: every receptacle that was listed, in walking order, with what was read there and nothing more. */
export function reportLog(facts: InspectionFacts, findings: SnapshotFinding[]): SnapshotLogRow[] {
  const world = buildWorld(facts);
  const areas = [...facts.areas].sort((a, b) => a.order - b.order || compareText(a.id, b.id));
  return areas.flatMap((area) =>
    facts.receptacles
      .filter((receptacle) => receptacle.areaId === area.id)
      .sort((a, b) => a.order - b.order || compareText(a.id, b.id))
      .map((receptacle, index) => {
        const point = world.byId.get(receptacle.id);
        const evidence = point?.evidence.variants[0];
        return {
          receptacleId: receptacle.id,
          areaId: area.id,
          number: index + 1,
          label: receptacle.label,
          presence: receptacle.presence,
          pattern: receptacle.pattern,
          device: receptacle.device,
          marks: receptacle.marks,
          lamps: evidence?.lamps,
          volts: evidence?.volts,
          circuit: facts.circuits.find((circuit) => circuit.id === receptacle.circuitId)?.breaker,
          protection: { en: point ? protectionWords(point) : '' },
          result: { en: point ? resultWords(point) : absentWords(receptacle.presence) },
          findings: findings
            .filter((finding) => finding.receptacleIds.includes(receptacle.id))
            .map((finding) => finding.number),
        };
      }),
  );
}

function absentWords(presence: 'present' | 'not-present' | 'removed'): string {
  return presence === 'removed' ? en.report.log.removed : en.report.log.notPresent;
}

/** A pattern that several faults share is said as what it most often is; lamps that read correct prove no ground. */
function resultWords(point: Point): string {
  if (point.evidence.conflicts.length > 0) return en.report.conflict;
  const diagnosis = point.diagnoses[0]?.diagnosis;
  const leading = diagnosis?.candidates.filter((candidate) => candidate.standing === 'leading') ?? [];
  const [first] = leading;
  if (!diagnosis || !first) {
    if (diagnosis?.conflict) return en.report.conflict;
    return point.skip ? `${en.report.log.notTested}: ${SKIP_WORDS[point.skip.reason]}` : en.report.log.notTested;
  }
  const words = [...new Set(leading.map((candidate) => en.report.condition[candidate.condition]))].join(' or ');
  if (leading.every((candidate) => candidate.condition === 'correct')) return words;
  const { lamps } = point.evidence.variants[0] ?? {};
  if (lamps && bitsOf(lamps) === '110') return en.report.correctUnproven;
  return diagnosis.candidates.length > 1 ? en.report.mostOften(words) : words;
}

function protectionWords(point: Point): string {
  const gfci = point.gfci.at(-1)?.assessment.verdict;
  const afci = point.afci.at(-1)?.assessment.verdict;
  const own = [gfci ? en.report.gfci[gfci] : '', afci ? en.report.afci[afci] : ''].filter(Boolean).join('; ');
  if (own) return own;
  return point.protection.state === 'yes' ? en.report.protectedBy(point.protection.by) : '';
}
