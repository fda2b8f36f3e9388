import type { TemplateValues } from '../facts';

export type TemplateVariable = {
  name: string;
  /** What it says, for the person who writes a template. */
  meaning: string;
  /** Stands in a preview, and is as long as it gets. */
  sample: string | number | boolean;
};

/** The names that a template of a finding may use. No others exist; a template with another name is refused. */
export const TEMPLATE_VARIABLES: readonly TemplateVariable[] = [
  { name: 'place', meaning: 'Where, in words', sample: 'Bedroom 2, by the window' },
  {
    name: 'where',
    meaning: 'Every place, a sentence per room without the last period',
    sample: 'Hall: left and right. Bedroom 3: by the door',
  },
  { name: 'count', meaning: 'How many receptacles', sample: 3 },
  { name: 'out_of', meaning: 'How many were looked at for this', sample: 6 },
  { name: 'noun', meaning: 'What is counted', sample: 'receptacles' },
  { name: 'wiring', meaning: 'grounded-cable, metal-raceway, two-wire or unknown', sample: 'two-wire' },
  { name: 'year_built', meaning: 'Year the house was built, or empty', sample: 1962 },
  { name: 'lamps', meaning: 'The three lamps', sample: 'hot to neutral lit, hot to ground lit, neutral to ground off' },
  {
    name: 'volts',
    meaning: 'The meter, V rms',
    sample: 'low-impedance meter: hot to neutral 119.8 volts, hot to ground 119.7 volts, neutral to ground 0.1 volts',
  },
  {
    name: 'sensor',
    meaning: 'The live-wire sensor',
    sample: 'hot slot quiet, ground slot answers, cover screw answers',
  },
  { name: 'live_ground', meaning: 'true where the sensor answered at the ground slot or cover', sample: true },
  { name: 'loads_unplugged', meaning: 'yes, no or unknown', sample: 'yes' },
  { name: 'power_checked', meaning: 'true where breaker, GFCI and switch were tried', sample: true },
  {
    name: 'most_often',
    meaning: 'What the reading most often means',
    sample: 'a broken neutral with something still connected to the circuit',
  },
  {
    name: 'also_possible',
    meaning: 'What else it can mean, or empty',
    sample: 'hot and ground swapped, or the same hot leg on both slots',
  },
  {
    name: 'next_check',
    meaning: 'The check that would tell most, or empty',
    sample: 'Touch the live-wire sensor to the cover screw.',
  },
  { name: 'ground_ohms', meaning: 'Ohms of the ground path, or empty', sample: 2.4 },
  { name: 'suspicion', meaning: 'Why a jumper is suspected: seen, load-test or house', sample: 'house' },
  { name: 'gfci_protected', meaning: 'true where a GFCI was shown to protect it', sample: false },
  { name: 'leg_volts', meaning: 'Volts between hot and neutral, or empty', sample: 146.2 },
  { name: 'leg_state', meaning: 'low or high', sample: 'high' },
  {
    name: 'opposite_leg',
    meaning: 'A place where the voltage is off the other way, or empty',
    sample: 'Kitchen, left of the sink',
  },
  { name: 'band', meaning: 'Name of the voltage band', sample: 'urgent-high' },
  { name: 'drop_percent', meaning: 'Voltage drop under load, percent', sample: 8.4 },
  { name: 'drop_volts', meaning: 'Voltage drop under load, V rms', sample: 10.1 },
  { name: 'load_amps', meaning: 'Load in amperes', sample: 12 },
  { name: 'temperature_rise', meaning: 'Degrees F above the surroundings, or empty', sample: 41 },
  { name: 'note', meaning: 'What the inspector wrote about it, or empty', sample: 'Brown mark above the upper slots.' },
  { name: 'verdict', meaning: 'Name of the trip test result', sample: 'line-load-reversed' },
  { name: 'result', meaning: 'Which way the trip test came out', sample: 'face-stays-live' },
  { name: 'device', meaning: 'receptacle, breaker or downstream', sample: 'receptacle' },
  { name: 'button', meaning: 'trips, no-trip or not-pressed', sample: 'trips' },
  { name: 'tester', meaning: 'trips, no-trip or not-used', sample: 'no-trip' },
  { name: 'milliamps', meaning: 'Test current in mA, or empty', sample: 30 },
  { name: 'seconds', meaning: 'Trip time in seconds, or empty', sample: 1.25 },
  { name: 'breaker_marking', meaning: 'class-a-gfci, dual-function, afci or other', sample: 'afci' },
  { name: 'mark_state', meaning: 'missing, or not-recorded where nobody looked', sample: 'missing' },
  {
    name: 'protected_by',
    meaning: 'What was shown to protect it',
    sample: 'the device at Bathroom 1, right of the basin',
  },
  { name: 'upstream', meaning: 'Place of the device upstream, or empty', sample: 'Bathroom 1, right of the basin' },
  { name: 'feeds', meaning: 'What it feeds', sample: 'medical equipment' },
  { name: 'device_found', meaning: 'no where somebody looked for a GFCI and found none', sample: 'no' },
  { name: 'asked_when_built', meaning: 'yes, no, unknown, or mixed where places differ', sample: 'no' },
  { name: 'since', meaning: 'Edition of the model code that first asked, or editions, or empty', sample: 1975 },
  { name: 'section', meaning: 'Section that the idea comes from, or empty', sample: '210.8(A)(1)' },
  {
    name: 'state_note',
    meaning: 'Sentence of the state profile, or empty',
    sample: 'Washington inspectors list this by place and advise adding the protection.',
  },
  { name: 'breaker', meaning: 'Breaker number, or empty', sample: '12' },
];

/** Every variable, empty. A finding fills in what it knows. */
export const EMPTY_VALUES: TemplateValues = Object.fromEntries(TEMPLATE_VARIABLES.map(({ name }) => [name, '']));

/** Every variable with its sample, for a preview without a finding. */
export const SAMPLE_VALUES: TemplateValues = Object.fromEntries(
  TEMPLATE_VARIABLES.map(({ name, sample }) => [name, sample]),
);
