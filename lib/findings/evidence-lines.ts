import { lampsInWords, sensorInWords, voltsInWords } from './evidence';
import type { EvidenceLine, ReadingFacts, WiringReadingEvidence } from './facts';
import type { World } from './points';

type Shown = { instrument: string; showed: string };

/** What each reading showed, one line per instrument, in the server's order. Volts V rms, time in seconds. */
export function evidenceLines(readingIds: readonly string[], world: World): EvidenceLine[] {
  const wanted = new Set(readingIds);
  const several = new Set(world.standing.filter((row) => wanted.has(row.id)).map((row) => row.receptacleId)).size > 1;
  return world.standing
    .filter((reading) => wanted.has(reading.id))
    .flatMap((reading) => {
      const place = reading.receptacleId ? world.byId.get(reading.receptacleId)?.place : undefined;
      return shownBy(reading).map(({ instrument, showed }) => ({
        readingId: reading.id,
        ...(reading.receptacleId ? { receptacleId: reading.receptacleId } : {}),
        at: reading.recordedAt,
        instrument,
        showed: several && place ? `${place}: ${showed}` : showed,
        by: reading.by,
      }));
    });
}

function shownBy(reading: ReadingFacts): Shown[] {
  switch (reading.kind) {
    case 'wiring':
      return wiringShown(reading.evidence);
    case 'load': {
      const { amps, noLoadHn, loadedHn, noLoadNg, loadedNg } = reading.evidence;
      const ground =
        noLoadNg !== undefined && loadedNg !== undefined
          ? `; neutral to ground ${noLoadNg} volts without and ${loadedNg} volts with the load`
          : '';
      return [
        {
          instrument: 'Load test',
          showed: `${amps} amperes: hot to neutral ${noLoadHn} volts without and ${loadedHn} volts with the load${ground}`,
        },
      ];
    }
    case 'gfci':
      return [{ instrument: 'GFCI trip test', showed: gfciShown(reading.evidence) }];
    case 'afci':
      return [{ instrument: 'AFCI trip test', showed: afciShown(reading.evidence) }];
    case 'physical': {
      const { signs, note, temperatureRiseF, amps } = reading.evidence;
      const rise = temperatureRiseF === undefined ? [] : [`${temperatureRiseF} degrees F warmer than its surroundings`];
      const load = amps === undefined ? [] : [`with ${amps} amperes`];
      const words = [...signs.map((sign) => sign.replaceAll('-', ' ')), ...rise, ...load, ...(note ? [note] : [])];
      return [{ instrument: 'Seen, heard or felt', showed: words.join('; ') }];
    }
  }
}

function wiringShown(evidence: WiringReadingEvidence): Shown[] {
  const loads = { yes: ', loads unplugged', no: ', loads plugged in', unknown: '' }[
    evidence.loadsUnplugged ?? 'unknown'
  ];
  const shown: Shown[] = [];
  if (evidence.lamps)
    shown.push({ instrument: 'Three-lamp tester', showed: `${lampsInWords(evidence.lamps)}${loads}` });
  for (const trio of [...(evidence.moreVolts ?? []), ...(evidence.volts ? [evidence.volts] : [])])
    shown.push({ instrument: 'Meter', showed: voltsInWords(trio) });
  if (evidence.sensor) shown.push({ instrument: 'Live-wire sensor', showed: sensorInWords(evidence.sensor) });
  if (evidence.groundOhms !== undefined)
    shown.push({ instrument: 'Ground-impedance instrument', showed: `${evidence.groundOhms} ohms` });
  if (evidence.groundJumperSeen) shown.push({ instrument: 'Seen', showed: 'a jumper to the ground terminal' });
  return shown;
}

type GfciEvidence = Extract<ReadingFacts, { kind: 'gfci' }>['evidence'];

function gfciShown(evidence: GfciEvidence): string {
  const said = (value: boolean | undefined, yes: string, no: string) => (value === undefined ? [] : [value ? yes : no]);
  const parts = [
    ...(evidence.notTestedReason ? [`not tested: ${evidence.notTestedReason}`] : []),
    ...(evidence.button ? [evidence.button === 'trips' ? 'own button trips' : 'own button does not trip'] : []),
    ...said(evidence.faceDead, 'face goes dead', 'face stays live'),
    ...(evidence.tester
      ? [evidence.tester === 'trips' ? 'plug-in tester trips it' : 'plug-in tester does not trip it']
      : []),
    ...said(evidence.resets, 'resets', 'does not reset'),
    ...said(evidence.downstreamDead, 'points downstream go dead', 'the point downstream stays live'),
    ...said(evidence.endOfLife, 'end-of-life signal', 'no end-of-life signal'),
    ...said(evidence.deviceFound, 'a GFCI device was found', 'no GFCI device was found'),
    ...(evidence.retrips === 'unloaded' ? ['trips again with loads unplugged'] : []),
    ...(evidence.retrips === 'with-appliance' ? ['trips again with one appliance'] : []),
    ...(evidence.measured ? [`${evidence.measured.milliamps} mA, ${evidence.measured.seconds} seconds`] : []),
    ...(evidence.wentDead?.length ? [`${evidence.wentDead.length} other points went dead`] : []),
  ];
  return parts.join(', ') || 'nothing recorded';
}

function afciShown(evidence: Extract<ReadingFacts, { kind: 'afci' }>['evidence']): string {
  const parts = [
    ...(evidence.notTestedReason ? [`not tested: ${evidence.notTestedReason}`] : []),
    ...(evidence.button ? [evidence.button === 'trips' ? 'own button trips' : 'own button does not trip'] : []),
    ...(evidence.circuitDead === undefined ? [] : [evidence.circuitDead ? 'circuit goes dead' : 'circuit stays live']),
    ...(evidence.resets === undefined ? [] : [evidence.resets ? 'resets' : 'does not reset']),
    ...(evidence.indicator ? [`plug-in indicator: ${evidence.indicator === 'trips' ? 'trips' : 'no trip'}`] : []),
  ];
  return parts.join(', ') || 'nothing recorded';
}
