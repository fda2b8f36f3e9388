import { FeedDrawing } from '@/components/drawings/feed-drawing';
import { en } from '@/lib/messages/en';
import type { Lamp } from '@/lib/findings/vocabulary';
import type { ReportSnapshot, SnapshotLogRow } from '@/lib/schemas/snapshot';
import { anchorOf } from './report-facts';
import { WebHeading } from './web-heading';
import { feedTrees, feedWords } from './report-feed';

const cell = 'py-2 pr-3 align-top';

/** Every receptacle with what was read there. The lamps are drawn and said. */
export function WebLog({ snapshot }: { snapshot: ReportSnapshot }) {
  const { log } = en.report;
  const names = new Map(snapshot.coverage.areas.map((area) => [area.areaId, area.name]));
  const heads = [log.area, log.number, log.place, log.device, log.lamps, log.volts, log.protection, log.result];
  return (
    <section aria-labelledby="log">
      <WebHeading id="log">{log.title}</WebHeading>
      <p className="mb-3 max-w-[62ch] font-serif leading-relaxed">{log.lead}</p>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-labelledby="log">
        <table className="w-full text-left text-s">
          <thead>
            <tr className="border-b border-ink">
              {heads.map((head) => (
                <th key={head} scope="col" className={`${cell} text-ink-2`}>
                  {head}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {snapshot.log.map((row) => (
              <LogRow key={row.receptacleId} row={row} area={names.get(row.areaId) ?? ''} />
            ))}
          </tbody>
        </table>
      </div>
      <p className="mt-2 text-s text-ink-2">{log.never}</p>
    </section>
  );
}

function LogRow({ row, area }: { row: SnapshotLogRow; area: string }) {
  return (
    <tr className="border-b border-hairline">
      <td className={`${cell} font-bold`}>{area}</td>
      <td className={cell}>{row.number}</td>
      <td className={cell}>{row.label}</td>
      <td className={cell}>{[row.pattern, en.report.device[row.device]].filter(Boolean).join(' ')}</td>
      <td className={`${cell} whitespace-nowrap`}>{row.lamps && <Beads row={row} />}</td>
      <td className={`${cell} whitespace-nowrap`}>
        {row.volts && `${row.volts.hn} / ${row.volts.hg} / ${row.volts.ng}`}
      </td>
      <td className={cell}>{row.protection.en}</td>
      <td className={cell}>
        {row.result.en}{' '}
        {row.findings.map((number) => (
          <a key={number} className="font-bold whitespace-nowrap" href={`#${anchorOf({ number })}`}>
            {en.report.log.finding([number])}{' '}
          </a>
        ))}
      </td>
    </tr>
  );
}

function Beads({ row }: { row: SnapshotLogRow }) {
  const { hn, hg, ng } = row.lamps ?? {};
  const lamps = row.pattern === '1-15R' ? [hn] : [hn, hg, ng];
  return (
    <>
      <span aria-hidden="true" className="inline-flex gap-1 align-middle">
        {lamps.map((lamp, index) => (
          <Bead key={index} lamp={lamp} />
        ))}
      </span>
      <span className="sr-only">{lamps.join(', ')}</span>
    </>
  );
}

const FILL: Record<Lamp, string> = {
  lit: 'bg-ink',
  dim: 'bg-[linear-gradient(90deg,var(--ink)_50%,transparent_50%)]',
  off: '',
};

function Bead({ lamp = 'off' }: { lamp?: Lamp }) {
  return (
    <span className={`inline-block size-3 rounded-full border border-ink [print-color-adjust:exact] ${FILL[lamp]}`} />
  );
}

/** What hangs from which breaker. */
export function WebCircuits({ snapshot }: { snapshot: ReportSnapshot }) {
  const { circuits } = en.report;
  if (snapshot.circuits.length === 0) return null;
  const heads = [circuits.breaker, circuits.label, circuits.feeds, circuits.protection];
  const panels = new Map(snapshot.panels.map((panel) => [panel.id, panel.name]));
  return (
    <section aria-labelledby="circuits">
      <WebHeading id="circuits">{circuits.title}</WebHeading>
      <p className="mb-3 max-w-[62ch] font-serif leading-relaxed">{`${circuits.lead} ${circuits.key}`}</p>
      {snapshot.panels.map((panel) =>
        feedTrees(snapshot, panel, en.report).map((tree, index) => (
          <figure key={`${panel.id}${index}`} className="mb-4">
            <FeedDrawing tree={tree} words={feedWords(panel, en.report)} />
          </figure>
        )),
      )}
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-labelledby="circuits">
        <table className="w-full text-left text-s">
          <thead>
            <tr className="border-b border-ink">
              {heads.map((head) => (
                <th key={head} scope="col" className={`${cell} text-ink-2`}>
                  {head}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {snapshot.circuits.map((circuit) => (
              <tr key={circuit.id} className="border-b border-hairline">
                <td className={cell}>
                  <b>{circuit.breaker}</b>
                  <span className="block text-ink-2">
                    {[panels.get(circuit.panelId), circuit.amps && `${circuit.amps} A`].filter(Boolean).join(', ')}
                  </span>
                </td>
                <td className={cell}>{circuit.labelAsFound || circuits.blank}</td>
                <td className={cell}>
                  {circuit.feeds.length === 0
                    ? circuits.nothing
                    : circuit.feeds.map((feed) => (
                        <span key={feed.receptacleId} className="block">
                          {feed.place}
                          {feed.off && <b>. {circuits.off}</b>}
                        </span>
                      ))}
                </td>
                <td className={cell}>{en.report.breaker[circuit.protection]}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}
