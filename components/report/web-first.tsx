import { ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';
import { HazardWord } from '@/components/findings/hazard-word';
import { en } from '@/lib/messages/en';
import type { SnapshotFinding } from '@/lib/schemas/snapshot';
import { anchorOf } from './report-facts';
import { WebHeading } from './web-heading';

/** What cannot wait, in plain words. */
export function WebFirst({ findings }: { findings: SnapshotFinding[] }) {
  return (
    <ol className="grid border-t border-ink">
      {findings.map((finding) => (
        <li
          key={finding.id}
          className="grid grid-cols-[5.5rem_minmax(0,1fr)] gap-4 border-b border-hairline py-6 break-inside-avoid max-sm:grid-cols-[minmax(0,1fr)]"
        >
          <div className="max-sm:hidden">{finding.drawing && <WebReading drawing={finding.drawing} size={88} />}</div>
          <div>
            <p>
              <HazardWord signal={finding.signal} small />
            </p>
            <p className="mt-2 font-serif text-l font-bold">{en.report.urgency[finding.urgency]}</p>
            <p className="font-bold">{finding.place}</p>
            <p className="mt-2 max-w-[62ch] font-serif leading-relaxed">{finding.text.en.plain}</p>
            <p className="mt-2 text-s print:hidden">
              <a className="inline-flex min-h-[44px] items-center" href={`#${anchorOf(finding)}`}>
                {en.report.web.readMore}
                <span className="sr-only">: {finding.place}</span>
              </a>
            </p>
          </div>
        </li>
      ))}
    </ol>
  );
}

export function WebLater({ findings }: { findings: SnapshotFinding[] }) {
  return (
    <section aria-labelledby="later">
      <WebHeading id="later">{en.report.first.later}</WebHeading>
      <ul>
        {findings.map((finding) => (
          <li key={finding.id} className="border-b border-hairline">
            <a className="block py-3 no-underline hover:underline" href={`#${anchorOf(finding)}`}>
              <HazardWord signal={finding.signal} small /> <b>{en.report.urgency[finding.urgency]}.</b> {finding.place}:{' '}
              {finding.text.en.title}
            </a>
          </li>
        ))}
      </ul>
    </section>
  );
}

type Drawing = NonNullable<SnapshotFinding['drawing']>;

/** What was read; the device itself where nothing was. */
export function WebReading({ drawing, size }: { drawing: Drawing; size: number }) {
  const { pattern, device, lamps, volts } = drawing;
  if (!lamps && !volts) return <ReceptacleDrawing view="face" pattern={pattern} device={device} size={size} />;
  return (
    <ReceptacleDrawing
      view="reading"
      pattern={pattern}
      device={device}
      size={size}
      {...(lamps ? { lamps } : { volts })}
    />
  );
}
