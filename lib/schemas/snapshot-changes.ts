import { canonicalJson, type ReportSnapshot } from './snapshot';

/** What differs between one version and the next, in sentences. Empty where the report says the same. */
export function snapshotChanges(before: ReportSnapshot, after: ReportSnapshot): string[] {
  if (canonicalJson(contentOf(before)) === canonicalJson(contentOf(after))) return [];
  const changes = [...findingChanges(before, after), ...countChanges(before, after)];
  for (const [key, says] of PARTS) if (canonicalJson(before[key]) !== canonicalJson(after[key])) changes.push(says);
  return changes.length > 0 ? changes : ['Details of the record changed.'];
}

/** The report without what every release renews. */
function contentOf(snapshot: ReportSnapshot): unknown {
  const {
    reportVersionId: _id,
    number: _number,
    releasedAt: _at,
    supersedes: _supersedes,
    reason: _reason,
    changes: _changes,
    overrides: _overrides,
    renderer: _renderer,
    signature: { signedAt: _signedAt, ...signature },
    ...rest
  } = snapshot;
  return { ...rest, signature };
}

const PARTS = [
  ['log', 'The log of receptacles changed.'],
  ['gaps', 'What stays unproven changed.'],
  ['notTested', 'What was not tested changed.'],
  ['circuits', 'The circuits changed.'],
  ['inspection', 'Facts of the house or the visit changed.'],
  ['buyers', 'The people named changed.'],
  ['firm', 'The firm’s details changed.'],
] as const satisfies readonly (readonly [keyof ReportSnapshot, string])[];

function findingChanges(before: ReportSnapshot, after: ReportSnapshot): string[] {
  const old = new Map(before.findings.map((finding) => [finding.id, finding]));
  const now = new Map(after.findings.map((finding) => [finding.id, finding]));
  const name = ({ place, text }: ReportSnapshot['findings'][number]) => `${place}: ${text.en.title}`;
  const added = after.findings.filter((finding) => !old.has(finding.id)).map((row) => `Added: ${name(row)}.`);
  const removed = before.findings.filter((finding) => !now.has(finding.id)).map((row) => `Removed: ${name(row)}.`);
  const changed = after.findings
    .filter((finding) => {
      const earlier = old.get(finding.id);
      return earlier && canonicalJson({ ...earlier, number: 0 }) !== canonicalJson({ ...finding, number: 0 });
    })
    .map((row) => `Changed: ${name(row)}.`);
  return [...added, ...removed, ...changed];
}

function countChanges(before: ReportSnapshot, after: ReportSnapshot): string[] {
  const old = new Set(before.photos.map((photo) => photo.id));
  const now = new Set(after.photos.map((photo) => photo.id));
  const added = [...now].filter((id) => !old.has(id)).length;
  const removed = [...old].filter((id) => !now.has(id)).length;
  return [
    added > 0 ? `${added} ${added === 1 ? 'photo' : 'photos'} added.` : '',
    removed > 0 ? `${removed} ${removed === 1 ? 'photo' : 'photos'} removed.` : '',
  ].filter(Boolean);
}
