import Link from 'next/link';
import { HazardWord } from '@/components/findings/hazard-word';
import type { DecidedFinding, DecisionStanding } from '@/db/report-findings';
import { URGENCY_SENTENCES } from '@/lib/findings';
import { URGENCIES } from '@/lib/findings/vocabulary';

const STANDING_WORDS: Record<DecisionStanding, string> = {
  undecided: 'to decide',
  kept: 'kept',
  dismissed: 'dismissed',
  changed: 'changed since you decided',
};

/** By what to do, then in the engine's order. */
export function FindingsList({
  inspectionId,
  findings,
  shownId,
}: {
  inspectionId: string;
  findings: DecidedFinding[];
  shownId?: string;
}) {
  return (
    <nav aria-label="Findings" className="grid content-start gap-6">
      {URGENCIES.map((urgency) => {
        const group = findings.filter((one) => one.urgency === urgency);
        if (group.length === 0) return null;
        return (
          <section key={urgency}>
            <h2 className="border-b border-ink pb-1 font-serif font-bold">{URGENCY_SENTENCES[urgency]}</h2>
            <ul>
              {group.map(({ finding, signal, standing, text }) => (
                <li
                  key={finding.id}
                  className={`border-b border-hairline ${finding.id === shownId ? 'border-l-4 border-l-ink bg-paper-2' : ''}`}
                >
                  <Link
                    href={`/inspections/${inspectionId}/findings?show=${encodeURIComponent(finding.id)}`}
                    aria-current={finding.id === shownId ? 'true' : undefined}
                    className="grid gap-1 px-3 py-3 no-underline hover:bg-paper-2"
                    scroll={false}
                  >
                    <b>{finding.place}</b>
                    <span>{text.title}</span>
                    <span className="flex flex-wrap items-center gap-3">
                      <HazardWord signal={signal} small />
                      <span className={standing === 'changed' ? 'font-bold' : 'text-s text-ink-2'}>
                        {STANDING_WORDS[standing]}
                      </span>
                    </span>
                  </Link>
                </li>
              ))}
            </ul>
          </section>
        );
      })}
    </nav>
  );
}
