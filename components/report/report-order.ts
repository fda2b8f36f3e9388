import type { ReportSnapshot, SnapshotFinding } from '@/lib/schemas/snapshot';

/** What a buyer must hear at once: to leave alone, or to have repaired within days. */
export function inFirstList({ urgency }: Pick<SnapshotFinding, 'urgency'>): boolean {
  return urgency === 'U1' || urgency === 'U2';
}

/** Findings that start a page of their own in the PDF. */
export function startsPage({ signal }: Pick<SnapshotFinding, 'signal'>): boolean {
  return signal === 'DANGER' || signal === 'WARNING';
}

export function leadCounts(findings: Pick<SnapshotFinding, 'urgency'>[]): { now: number; days: number; rest: number } {
  const now = findings.filter((finding) => finding.urgency === 'U1').length;
  const days = findings.filter((finding) => finding.urgency === 'U2').length;
  return { now, days, rest: findings.length - now - days };
}

/** Photos that no finding shows; the report prints them too. */
export function otherPhotoIds({ photos, findings }: Pick<ReportSnapshot, 'photos' | 'findings'>): string[] {
  const shown = new Set(findings.flatMap((finding) => finding.photoIds));
  return photos.flatMap((photo) => (shown.has(photo.id) ? [] : photo.id));
}
