import type { ReportMessages } from '@/lib/messages/en-report';
import type { SnapshotFinding } from '@/lib/schemas/snapshot';

type Drawing = NonNullable<SnapshotFinding['drawing']>;

/** The reading under its drawing, in words. */
export function readingWords({ lamps, volts }: Drawing): string {
  if (lamps) return `H-N ${lamps.hn}, H-G ${lamps.hg}, N-G ${lamps.ng}`;
  if (volts) return `H-N ${volts.hn} V, H-G ${volts.hg} V, N-G ${volts.ng} V`;
  return '';
}

/** The leading condition under its drawing, in words. */
export function wiresWords({ condition }: Drawing, messages: ReportMessages): string {
  if (!condition) return '';
  const words = messages.condition[condition];
  return words.charAt(0).toUpperCase() + words.slice(1);
}
