import Image from 'next/image';
import { ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';
import { HazardWord } from '@/components/findings/hazard-word';
import { timeIn } from '@/lib/messages/dates';
import { en } from '@/lib/messages/en';
import type { ReportSnapshot, SnapshotFinding } from '@/lib/schemas/snapshot';
import { readingWords, wiresWords } from './report-drawing-words';
import { anchorOf, headline } from './report-facts';
import { WebReading } from './web-first';

type PhotoSrc = (photoId: string, size: '480' | '1600') => string;
type WebFindingProps = { finding: SnapshotFinding; snapshot: ReportSnapshot; photoSrc: PhotoSrc };

/** One finding: what was read, what it most often means, what the danger is, and what none of it proves. */
export function WebFinding({ finding, snapshot, photoSrc }: WebFindingProps) {
  const text = finding.text.en;
  const words = en.report.finding;
  return (
    <section aria-labelledby={anchorOf(finding)} className="grid gap-5 print:break-before-page">
      <div>
        <p className="flex flex-wrap items-center gap-3">
          <HazardWord signal={finding.signal} />
          <span className="font-serif text-l font-bold">{en.report.urgency[finding.urgency]}</span>
        </p>
        <h3 id={anchorOf(finding)} className="mt-3 font-serif text-xl font-bold">
          {headline(finding, text.title)}
        </h3>
      </div>
      <Drawings finding={finding} />
      <HazardParts finding={finding} />
      <div className="grid max-w-[62ch] gap-3 font-serif leading-relaxed">
        <p>{text.observed}</p>
        <p>{text.means}</p>
      </div>
      <Evidence finding={finding} timeZone={snapshot.inspection.timeZone} />
      <div className="border-l-[3px] border-double border-rule pl-4">
        <h4 className="font-bold">{words.unproven}</h4>
        {text.unproven.map((line) => (
          <p key={line}>{line}</p>
        ))}
      </div>
      <p className="border border-ink p-4">
        <b>{words.referral}</b> {text.doNext}
      </p>
      {finding.hook && <p className="text-s text-ink-2">{words.hook(finding.hook.section, finding.hook.since)}</p>}
      <WebPhotos photoIds={finding.photoIds} snapshot={snapshot} photoSrc={photoSrc} />
    </section>
  );
}

function Drawings({ finding: { drawing } }: { finding: SnapshotFinding }) {
  if (!drawing) return null;
  return (
    <div className="flex flex-wrap items-end gap-8">
      <figure className="w-52 text-center">
        <WebReading drawing={drawing} size={176} />
        <figcaption className="mt-2 text-s">
          <b className="block">{en.report.finding.read}</b>
          {readingWords(drawing)}
        </figcaption>
      </figure>
      {drawing.condition && (
        <figure className="w-52 text-center">
          <ReceptacleDrawing view="wiring" pattern={drawing.pattern} condition={drawing.condition} size={212} />
          <figcaption className="mt-2 text-s">
            <b className="block">{en.report.finding.means}</b>
            {wiresWords(drawing, en.report)}
          </figcaption>
        </figure>
      )}
    </div>
  );
}

function HazardParts({ finding }: { finding: SnapshotFinding }) {
  const { hazard, who } = finding.text.en;
  const words = en.report.finding;
  const parts = [
    [words.danger, hazard.type],
    [words.does, hazard.consequence],
    [words.avoid, hazard.avoid],
    [words.who, who],
  ];
  return (
    <dl className="grid border-y border-ink sm:grid-cols-4">
      {parts.map(([term, says]) => (
        <div
          key={term}
          className="border-hairline py-3 pr-3 max-sm:border-b sm:border-l sm:pl-3 sm:first:border-l-0 sm:first:pl-0"
        >
          <dt className="font-bold">{term}</dt>
          <dd>{says}</dd>
        </div>
      ))}
    </dl>
  );
}

function Evidence({ finding, timeZone }: { finding: SnapshotFinding; timeZone: string }) {
  const told = finding.told.map(({ at, whom, note }) => ({
    at,
    instrument: en.report.finding.told,
    showed: [whom, note].filter(Boolean).join('. '),
  }));
  return (
    <table className="w-full text-left">
      <caption className="text-left font-bold">{en.report.finding.evidence}</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">{en.report.web.time}</th>
          <th scope="col">{en.report.web.instrument}</th>
          <th scope="col">{en.report.web.showed}</th>
        </tr>
      </thead>
      <tbody>
        {[...finding.evidence, ...told].map((line, index) => (
          <tr key={index} className="border-b border-hairline align-top">
            <td className="w-24 py-2 pr-3">{line.at ? timeIn(timeZone, line.at) : ''}</td>
            <td className="w-40 py-2 pr-3">{line.instrument}</td>
            <td className="py-2">{line.showed}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

type WebPhotosProps = { photoIds: string[]; snapshot: ReportSnapshot; photoSrc: PhotoSrc };

export function WebPhotos({ photoIds, snapshot, photoSrc }: WebPhotosProps) {
  const photos = photoIds.flatMap((id) => snapshot.photos.find((photo) => photo.id === id) ?? []);
  if (photos.length === 0) return null;
  return (
    <ul className="grid gap-6 sm:grid-cols-2">
      {photos.map((photo) => (
        <li key={photo.id}>
          <figure>
            <a href={photoSrc(photo.id, '1600')}>
              <Image
                unoptimized
                src={photoSrc(photo.id, '1600')}
                alt={photo.caption || en.report.web.photoOf(photo.number, photo.place)}
                width={photo.width ?? 1600}
                height={photo.height ?? 1200}
                className="h-auto w-full border border-hairline"
              />
            </a>
            <figcaption className="mt-1 text-s">
              <b>
                {en.report.finding.photo(photo.number)}
                {photo.takenAt && `, ${timeIn(snapshot.inspection.timeZone, photo.takenAt)}`}
              </b>
              {photo.caption && `. ${photo.caption}`}
            </figcaption>
          </figure>
        </li>
      ))}
    </ul>
  );
}
