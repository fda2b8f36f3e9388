import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { REPORT_LIMITS } from '@/lib/findings/wording/report-limits';
import { en } from '@/lib/messages/en';
import { canonicalJson, RENDERER, type ReportSnapshot, type SnapshotFinding } from '@/lib/schemas/snapshot';

const FIRM = '0192f0aa-0000-7000-8000-000000000001';
const id = (n: number) => `0192f0aa-0000-7000-8000-${String(n).padStart(12, '0')}`;
const at = (time: string) => `2026-12-01T${time}:00Z`;

/** A released report of an invented two-wire house, as release would have frozen it. */
export async function goldenSnapshot(): Promise<{
  snapshot: ReportSnapshot;
  sha256: string;
  photos: Map<string, Buffer>;
}> {
  const photos = new Map([
    [id(801), await drawnPhoto('#8a806e')],
    [id(802), await drawnPhoto('#5c5548')],
  ]);
  const snapshot = build([...photos].map(([photoId, bytes]) => ({ id: photoId, sha256: hash(bytes) })));
  return { snapshot, sha256: hash(canonicalJson(snapshot)), photos };
}

export function hash(content: string | Buffer): string {
  return createHash('sha256').update(content).digest('hex');
}

async function drawnPhoto(background: string): Promise<Buffer> {
  return sharp({ create: { width: 1200, height: 900, channels: 3, background } })
    .jpeg()
    .toBuffer();
}

function build(stored: { id: string; sha256: string }[]): ReportSnapshot {
  return {
    schema: 1,
    renderer: RENDERER,
    reportVersionId: id(900),
    number: 2,
    releasedAt: at('22:05'),
    supersedes: { id: id(899), number: 1, sha256: 'b'.repeat(64) },
    reason: 'A photo of the cover screw was added.',
    changes: ['Photo 2 added to finding 1.'],
    overrides: [
      { code: 'reading-grade', says: 'The summary reads at grade 8.6.', reason: 'The buyer is an engineer.' },
    ],
    firm: {
      name: 'Harrow Lane Home Inspection',
      address: '12 Harrow Lane, Alder Falls, NY 12000',
      phone: '555-0108',
      email: 'office@harrow-lane.example',
      licenseNumber: '16000000001',
    },
    inspection: {
      id: id(2),
      number: 412,
      street: '418 Penstemon Road',
      cityLine: 'Alder Falls, NY 12000',
      county: 'Weir',
      timeZone: 'America/New_York',
      scheduledAt: at('14:00'),
      walkedAt: { first: at('14:20'), last: at('16:10') },
      yearBuilt: 1962,
      wiringMethod: 'two-wire',
      serviceAmps: 100,
      codeEdition: 2020,
      codeEditionSource: 'State of New York, adopted 2025',
    },
    stateProfile: {
      code: 'NY',
      name: 'New York',
      duties: [{ says: 'License number and status stand on every report.', section: 'RPP 444-g' }],
    },
    buyers: [{ name: 'Nguyễn Thị Łódź-Şahin', email: 'buyer@raman.example' }],
    agents: [{ name: 'José Peñalver' }],
    inspectors: [{ membershipId: id(3), name: 'Ruth Okafor', licenseNumber: '5550', licenseState: 'NY', leads: true }],
    signature: { membershipId: id(3), name: 'Ruth Okafor', licenseNumber: '5550', signedAt: at('22:05') },
    coverage: {
      present: 12,
      tested: 11,
      skipped: 1,
      areas: [
        { areaId: id(20), name: 'Garage', structure: 'Main house', present: 4, tested: 4, skipped: 0 },
        { areaId: id(21), name: 'Bedroom 2', structure: 'Main house', present: 8, tested: 7, skipped: 1 },
      ],
      leftOff: ['Garage, bench left: breaker 9 off, told Dell Arden'],
    },
    findings: findings(),
    gaps: [
      {
        id: 'gap-1',
        kind: 'unproven',
        place: 'Bedroom 2, door',
        says: {
          en: 'The lamps read correct in a house wired without a ground wire. The ground slot is most often joined to neutral at the receptacle then. It was not opened, so this stays unproven.',
        },
      },
      {
        id: 'gap-2',
        kind: 'unproven',
        place: 'Garage, by the door',
        says: {
          en: 'The button trips the GFCI. The plug-in tester did nothing, because there is no ground for it to leak to; that says nothing about the GFCI.',
        },
      },
    ],
    log: logRows(),
    panels: [{ id: id(30), name: 'Panel A', kind: 'main', place: 'Garage, north wall' }],
    circuits: [
      {
        id: id(31),
        panelId: id(30),
        breaker: '9',
        poles: 1,
        amps: 15,
        wireAwg: 14,
        labelAsFound: 'Garage',
        protection: 'none',
        feeds: [
          { receptacleId: id(40), place: 'Garage, bench left', pattern: '5-15R', device: 'receptacle', off: true },
          {
            receptacleId: id(43),
            place: 'Garage, by the door',
            pattern: '5-15R',
            device: 'gfci-receptacle',
            off: false,
          },
        ],
      },
      { id: id(32), panelId: id(30), breaker: '12/14', poles: 2, amps: 30, protection: 'unknown', feeds: [] },
    ],
    notTested: [
      {
        place: 'Bedroom 2, receptacle 8',
        reason: 'blocked',
        says: { en: 'Not tested: blocked by furniture or stored goods.' },
        note: 'Behind the wardrobe.',
      },
    ],
    photos: stored.map((photo, index) => ({
      id: photo.id,
      number: index + 1,
      key: `firm/${FIRM}/photo/${photo.id}/1600`,
      sha256: 'a'.repeat(64),
      sha256Of1600: photo.sha256,
      width: 1200,
      height: 900,
      caption: index === 0 ? 'The live-wire sensor at the cover screw' : 'The same receptacle, cover in place',
      takenAt: at('15:36'),
      place: 'Garage, bench left',
      receptacleId: id(40),
    })),
    limits: { en: [...REPORT_LIMITS] },
  };
}

function findings(): SnapshotFinding[] {
  const danger = finding(1, 'W12', 'DANGER', 'U1', 'Garage, bench left', {
    title: 'The ground slot is live while the lamps read correct',
    observed:
      'The three lamps read correct. The live-wire sensor answers at the ground slot and at the cover screw, and not at the hot slot.',
    means:
      'A lamp tester compares the three slots with each other. Here the neutral and ground slots are live and the hot slot is not. The differences are those of a correct receptacle, so the lamps see nothing wrong.',
    plain:
      'The ground slot is live. The metal case of anything plugged in here will shock you. It can kill. Breaker 9 is off. Leave it off until a licensed electrician has repaired it.',
  });
  danger.drawing = {
    pattern: '5-15R',
    device: 'receptacle',
    lamps: { hn: 'lit', hg: 'lit', ng: 'off' },
    volts: { hn: 119.8, hg: 119.7, ng: 0, meter: 'low-impedance' },
    condition: 'reversed-bootleg-ground',
  };
  danger.told = [{ at: at('15:42'), whom: 'Dell Arden, seller', note: 'Breaker 9 off and taped.' }];
  danger.photoIds = [id(801), id(802)];
  danger.receptacleIds = [id(40)];

  const warning = finding(2, 'W04', 'WARNING', 'U2', 'Bedroom 2, by the window', {
    title: 'The neutral is most often open when the lamps show this',
    observed: 'Only the lamps from hot to ground and from neutral to ground are lit.',
    means: 'Something plugged in makes the neutral slot live through itself. The neutral wire is open upstream.',
    plain: 'The neutral wire is most often broken when we read this. Parts could be live. Plug nothing in here.',
  });
  warning.drawing = {
    pattern: '5-15R',
    device: 'receptacle',
    lamps: { hn: 'off', hg: 'lit', ng: 'lit' },
    condition: 'open-neutral-with-load',
  };
  warning.receptacleIds = [id(41)];

  const caution = finding(3, 'P09', 'CAUTION', 'U3', 'Outside, patio', {
    title: 'The cover lets rain reach a plug',
    observed: 'The cover closes only when nothing is plugged in.',
    means: 'Rain can reach the plug while it is in use.',
    plain: 'The cover lets rain reach a plug. Plan a cover that closes over a cord.',
  });
  const notice = finding(4, 'L01', 'NOTICE', 'note', 'Panel A', {
    title: 'Two labels differ from what they feed',
    observed: 'Breakers 5 and 6 are labelled for other rooms than those they feed.',
    means: 'Somebody could switch off the wrong breaker.',
    plain: 'Two labels at the panel differ from what they feed.',
  });
  return [danger, warning, caution, notice];
}

function finding(
  number: number,
  code: string,
  signal: SnapshotFinding['signal'],
  urgency: SnapshotFinding['urgency'],
  place: string,
  text: { title: string; observed: string; means: string; plain: string },
): SnapshotFinding {
  return {
    id: `${code}:${number}`,
    code,
    number,
    signal,
    urgency,
    who: 'electrician',
    place,
    receptacleIds: [],
    text: {
      en: {
        ...text,
        hazard: {
          signal,
          type: 'The ground slot carries 120 volts.',
          consequence: 'A metal case plugged in here becomes live. Touching it can kill.',
          avoid: 'Leave the breaker off. Plug nothing in until it is repaired.',
        },
        doNext: 'Have a licensed electrician find the cause, correct it, and test every receptacle on this breaker.',
        who: 'A licensed electrician, before the circuit is used again.',
        caution: `${signal}. The ground slot carries 120 volts.`,
        evidence: [],
        unproven: ['The box was not opened.', 'Where the jumper sits, here or upstream, is not known.'],
      },
    },
    evidence: [
      { at: at('15:31'), instrument: 'Lamps', showed: 'lit, lit, off', by: 'Ruth Okafor' },
      { at: at('15:33'), instrument: 'Low-impedance meter', showed: '119.8, 119.7 and 0.0 volts', by: 'Ruth Okafor' },
    ],
    told: [],
    photoIds: [],
    hook: { section: '406.4', since: 1962, confidence: 'medium' },
  };
}

function logRows(): ReportSnapshot['log'] {
  const labels = ['bench left', 'bench right', 'door opener', 'by the door'];
  return Array.from({ length: 12 }, (_, index) => {
    const inGarage = index < 4;
    return {
      receptacleId: id(40 + index),
      areaId: inGarage ? id(20) : id(21),
      number: inGarage ? index + 1 : index - 3,
      label: inGarage ? (labels[index] ?? '') : `wall ${index - 3}`,
      presence: 'present' as const,
      pattern: index === 5 ? ('1-15R' as const) : ('5-15R' as const),
      device: index === 3 ? ('gfci-receptacle' as const) : ('receptacle' as const),
      marks: [],
      lamps:
        index === 11
          ? undefined
          : { hn: 'lit' as const, hg: index % 2 ? ('off' as const) : ('lit' as const), ng: 'off' as const },
      volts: index === 0 ? { hn: 119.8, hg: 119.7, ng: 0, meter: 'low-impedance' as const } : undefined,
      circuit: index < 2 ? '9' : undefined,
      protection: { en: index === 3 ? en.report.gfci['works-no-ground'] : '' },
      result: { en: index === 11 ? en.report.log.notTested : en.report.condition['open-ground'] },
      findings: index === 0 ? [1] : [],
    };
  });
}
