import 'server-only';
import { composeFinding, evaluateInspection } from '@/lib/findings';
import type { ComposedFinding, Finding, Gap } from '@/lib/findings/facts';
import { SIGNALS, URGENCIES, type Signal, type Urgency } from '@/lib/findings/vocabulary';
import { inspectionFacts } from '@/lib/schemas/inspection-facts';
import type { WalkDecision } from '@/lib/schemas/walk';
import type { MemberActor } from './actor';
import { loadWalk } from './inspections';
import type { ReportSources } from './report-sources';

export type DecisionStanding = 'undecided' | 'changed' | 'kept' | 'dismissed';

/** A derived finding with what the inspector decided of it. */
export type DecidedFinding = {
  finding: Finding;
  standing: DecisionStanding;
  decision?: WalkDecision;
  signal: Signal;
  urgency: Urgency;
  text: ComposedFinding;
};

/** Every finding of the facts, gravest first, with its decision. A decision on other evidence stands as "changed". */
export function decideFindings({ evaluation, state }: Pick<ReportSources, 'evaluation' | 'state'>): DecidedFinding[] {
  const last = new Map<string, WalkDecision>();
  for (const decision of state.decisions) last.set(decision.findingId, decision);
  return evaluation.findings.map((finding) => decided(finding, last.get(finding.id))).sort((a, b) => rank(a) - rank(b));
}

function rank({ signal, urgency }: DecidedFinding): number {
  return SIGNALS.indexOf(signal) * URGENCIES.length + URGENCIES.indexOf(urgency);
}

function decided(finding: Finding, decision: WalkDecision | undefined): DecidedFinding {
  const signal = graver(finding.signal, decision?.raisedSignal);
  const composed = composeFinding({ ...finding, signal }, { locale: 'en' });
  const text = {
    ...composed,
    observed: decision?.ownWords?.observed || composed.observed,
    plain: decision?.ownWords?.plain || composed.plain,
  };
  return {
    finding,
    standing: standingOf(finding, decision),
    ...(decision ? { decision } : {}),
    signal,
    urgency: signal === finding.signal ? finding.urgency : sooner(finding.urgency, signal),
    text,
  };
}

function standingOf(finding: Finding, decision: WalkDecision | undefined): DecisionStanding {
  if (!decision) return 'undecided';
  const seen = new Set(decision.sawReadingIds);
  const isSame = finding.readingIds.length === seen.size && finding.readingIds.every((id) => seen.has(id));
  return isSame ? decision.decision : 'changed';
}

/** An inspector can raise a signal and never lower it. */
function graver(derived: Signal, raised: Signal | undefined): Signal {
  return raised && SIGNALS.indexOf(raised) < SIGNALS.indexOf(derived) ? raised : derived;
}

/** What to do keeps up with a raised signal. */
function sooner(urgency: Urgency, signal: Signal): Urgency {
  const least = ({ DANGER: 'U1', WARNING: 'U2', CAUTION: 'U3', NOTICE: 'note' } as const)[signal];
  return URGENCIES.indexOf(least) < URGENCIES.indexOf(urgency) ? least : urgency;
}

export type FindingPhoto = { id: string; caption: string };

/** The findings of an inspection with their decisions, what stays unproven, and the photos that stand; null where not visible. */
export async function loadFindings(
  actor: MemberActor,
  inspectionId: string,
): Promise<{ findings: DecidedFinding[]; gaps: Gap[]; photos: FindingPhoto[]; timeZone: string } | null> {
  const walk = await loadWalk(actor, inspectionId);
  if (!walk) return null;
  const { state } = walk;
  const evaluation = evaluateInspection(inspectionFacts(state));
  const photos = state.photos
    .filter((photo) => !photo.deleted && photo.state === 'stored')
    .map(({ id, caption }) => ({ id, caption }));
  return {
    findings: decideFindings({ evaluation, state }),
    gaps: evaluation.gaps,
    photos,
    timeZone: state.inspection.timeZone,
  };
}
