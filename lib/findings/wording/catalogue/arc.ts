import type { CatalogueEntry } from './entry';
import { ELECTRICIAN, SINCE } from './phrases';

/** A01–A04: protection from arcs. */
export const ARC_ROWS: readonly CatalogueEntry[] = [
  {
    code: 'A01',
    signal: 'WARNING',
    urgency: 'U2',
    who: 'electrician',
    evidenceNeeded: ['result of its own button'],
    hook: { section: 'UL 1699', confidence: 'medium' },
    en: {
      title: 'AFCI does not work by its own button',
      observed: `{{ place }}: {% case result %}{% when 'stays-live' %}the button clicks and the circuit stays live.{% when 'no-reset' %}it tripped and does not reset.{% else %}the button does not trip it.{% endcase %}`,
      means: 'Its own button is the only accepted test. Protection from sparks was not shown.',
      hazardType: 'Fire from sparks in a wire or cord.',
      consequence: 'A damaged wire can spark and start a fire with the power still on.',
      avoid: 'Look at cords on this circuit, and have the device replaced within days.',
      plain:
        'The device that cuts the power on sparks did not work. A bad cord could start a fire. Have it replaced within days.',
      doNext: 'Have a licensed electrician replace the device or find the fault, and test it by its button.',
      who: ELECTRICIAN,
      caution: 'A plug-in indicator does not decide this. Only the button of the device does.',
      unproven:
        'Which outlets it protects, where that was not traced. A device that does not reset may show a fault in the wiring.',
    },
  },
  {
    code: 'A02',
    signal: 'NOTICE',
    urgency: 'U4',
    who: 'electrician',
    evidenceNeeded: ['photo of the panel'],
    hook: { section: '210.12', since: 1999, confidence: 'high' },
    en: {
      title: 'No AFCI protection recorded',
      observed: 'No AFCI is recorded for {{ count }} of {{ out_of }} {{ noun }}. {{ where }}.',
      means: `An AFCI cuts the power when a wire or cord sparks. Current safety practice recommends it for these rooms.${SINCE}`,
      hazardType: 'A fire-safety upgrade that is not there.',
      consequence: 'A damaged wire or cord can spark and start a fire.',
      avoid: 'Replace worn cords, and run none under carpets.',
      plain:
        'A newer kind of breaker cuts the power when a cord sparks. We saw none for these rooms. Think about adding it.',
      doNext: 'Ask a licensed electrician what it would take to add AFCI protection.',
      who: ELECTRICIAN,
      caution: 'In old wiring an AFCI can trip on faults that are already there.',
      unproven: 'A device at the first outlet of a circuit was not looked for everywhere.',
    },
  },
  {
    code: 'A03',
    signal: 'WARNING',
    urgency: 'U2',
    who: 'electrician',
    evidenceNeeded: ['what tripped it, and when'],
    hook: { section: '210.12', confidence: 'low' },
    en: {
      title: 'AFCI trips again and again',
      observed: '{{ place }}: the AFCI is reported to trip repeatedly.',
      means: 'Sparks in a wire or cord, a shared neutral, or one appliance can each do this.',
      hazardType: 'Fire from sparks in a wire or cord.',
      consequence: 'The device may be seeing a real fault.',
      avoid: 'Unplug what runs on the circuit, and do not keep resetting it.',
      plain:
        'The device keeps cutting the power. It may see a real fault. Unplug what runs on it and have it looked at.',
      doNext: 'Have a licensed electrician find what it trips on.',
      who: ELECTRICIAN,
      caution: 'Do not swap it for a plain breaker to end the trips.',
      unproven: 'What it trips on.',
    },
  },
  {
    code: 'A04',
    signal: 'CAUTION',
    urgency: 'U3',
    who: 'electrician',
    evidenceNeeded: ['panel directory against the breaker'],
    hook: { section: '210.12', confidence: 'low' },
    en: {
      title: 'AFCI breaker seems to have been taken out',
      observed: '{{ place }}: the directory names an AFCI, and the breaker is a plain one.',
      means: 'Protection that was once there seems to be gone. It is often taken out when it trips a lot.',
      hazardType: 'Fire from sparks in a wire or cord.',
      consequence: 'A fault that made it trip may still be there.',
      avoid: 'Use no worn cords on this circuit.',
      plain:
        'A device that cuts the power on sparks seems to be gone. The fault it saw may still be there. Plan to have it put back.',
      doNext: 'Have a licensed electrician find why it was taken out, and put the protection back.',
      who: ELECTRICIAN,
      caution: 'Do not take the plain breaker as a repair.',
      unproven: 'The directory may be older than the panel.',
    },
  },
];
