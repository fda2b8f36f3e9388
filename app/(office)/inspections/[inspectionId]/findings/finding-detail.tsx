import { ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';
import { HazardWord } from '@/components/findings/hazard-word';
import type { DecidedFinding, FindingPhoto } from '@/db/report-findings';
import { CONDITION_WORDS, lampsInWords, URGENCY_SENTENCES } from '@/lib/findings';
import { DecisionForm } from './decision-form';

type DetailProps = {
  inspectionId: string;
  shown: DecidedFinding;
  photos: FindingPhoto[];
  timeZone: string;
  mayDecide: boolean;
  /** The next finding that waits, and how many wait after this one. */
  nextId?: string;
  left: number;
};

/** One finding as the report will say it, with its evidence and what the inspector decides. */
export function FindingDetail({ inspectionId, shown, photos, timeZone, mayDecide, nextId, left }: DetailProps) {
  const { finding, signal, urgency, text, decision, standing } = shown;
  const own = photos.filter((photo) => finding.photoIds.includes(photo.id));
  return (
    <article className="grid min-w-0 content-start gap-6" aria-labelledby="finding">
      <header className="grid gap-3">
        <p className="flex flex-wrap items-center gap-3">
          <HazardWord signal={signal} />
          <b className="font-serif">{URGENCY_SENTENCES[urgency]}</b>
        </p>
        <h2 id="finding" className="font-serif text-xl font-bold">
          {finding.place}: {text.title}
        </h2>
      </header>
      <div className="flex flex-wrap items-end gap-x-8 gap-y-4">
        <FindingDrawings shown={shown} />
        <div className="limits max-w-[40ch] text-s">
          <h3 className="font-bold">Not proven</h3>
          {text.unproven.map((words) => (
            <p key={words}>{words}</p>
          ))}
        </div>
      </div>
      <p className="max-w-[62ch] font-serif leading-relaxed">{text.observed}</p>
      <p className="max-w-[62ch] font-serif leading-relaxed">{text.means}</p>
      <dl className="grid border-y border-ink sm:grid-cols-2 xl:grid-cols-4">
        {(
          [
            ['What the danger is', text.hazard.type],
            ['What it does', text.hazard.consequence],
            ['How to avoid it', text.hazard.avoid],
            ['Who repairs it', text.who],
          ] as const
        ).map(([term, words]) => (
          <div key={term} className="border-hairline px-3 py-3 not-first:border-l max-sm:border-l-0">
            <dt className="font-bold">{term}</dt>
            <dd>{words}</dd>
          </div>
        ))}
      </dl>
      <p className="max-w-[62ch] font-serif text-l leading-relaxed">
        <span className="block font-sans text-s text-ink-2">In plain words for the buyer</span>
        {text.plain}
      </p>
      <Evidence shown={shown} timeZone={timeZone} />
      {own.length > 0 && (
        <ul className="grid gap-4 sm:grid-cols-2">
          {own.map((photo) => (
            <li key={photo.id}>
              {/* The bytes come from our own route, which checks who asks. */}
              <img
                src={`/api/photos/${photo.id}?size=480`}
                alt={photo.caption || 'Photo at this receptacle'}
                className="w-full border border-hairline"
                loading="lazy"
              />
              <p className="text-s">{photo.caption}</p>
            </li>
          ))}
        </ul>
      )}
      {mayDecide && (
        <DecisionForm
          inspectionId={inspectionId}
          findingId={finding.id}
          readingIds={finding.readingIds}
          signal={finding.signal}
          standing={standing}
          nextId={nextId}
          left={left}
          decision={decision}
          original={{ observed: text.observed, plain: text.plain }}
        />
      )}
    </article>
  );
}

function FindingDrawings({ shown: { finding } }: { shown: DecidedFinding }) {
  const { drawing } = finding;
  if (!drawing) return null;
  const { pattern, lamps, volts, condition } = drawing;
  return (
    <>
      {(lamps ?? volts) && (
        <figure className="grid max-w-[220px] gap-2 text-center text-s">
          <ReceptacleDrawing
            pattern={pattern}
            view="reading"
            lamps={lamps}
            volts={lamps ? undefined : volts}
            size={170}
          />
          <figcaption>
            <b className="block">What was read</b>
            {lamps ? lampsInWords(lamps) : 'Volts between the slots'}
          </figcaption>
        </figure>
      )}
      {condition && (
        <figure className="grid max-w-[220px] gap-2 text-center text-s">
          <ReceptacleDrawing pattern={pattern} view="wiring" condition={condition} size={190} />
          <figcaption>
            <b className="block">What that most often means</b>
            {CONDITION_WORDS[condition]}
          </figcaption>
        </figure>
      )}
    </>
  );
}

function Evidence({ shown: { finding }, timeZone }: { shown: DecidedFinding; timeZone: string }) {
  const format = new Intl.DateTimeFormat('en-US', { timeZone, timeStyle: 'short' });
  if (finding.evidence.length === 0) return null;
  return (
    <div className="overflow-x-auto">
      <table className="w-full text-left">
        <caption className="pb-2 text-left font-serif font-bold">Evidence</caption>
        <thead className="border-b border-ink text-s">
          <tr>
            <th className="py-1 pr-4">Time</th>
            <th className="py-1 pr-4">Reading</th>
            <th className="py-1 pr-4">Showed</th>
            <th className="py-1">By</th>
          </tr>
        </thead>
        <tbody>
          {finding.evidence.map((line, index) => (
            <tr key={`${line.readingId}${index}`} className="border-b border-hairline align-top">
              <td className="py-2 pr-4 whitespace-nowrap">{line.at ? format.format(new Date(line.at)) : ''}</td>
              <td className="py-2 pr-4">{line.instrument}</td>
              <td className="py-2 pr-4">{line.showed}</td>
              <td className="py-2">{line.by}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
