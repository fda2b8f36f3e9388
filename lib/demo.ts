/** Who can sign in to the invented firm. Shown on the sign-in page, and true, only while the demo runs. */
export const DEMO_FIRM_NAME = 'Harrow Lane Home Inspection';
const DEMO_PASSWORD = 'brass silver green 6';

export const DEMO_SIGN_INS = [
  { label: 'Owner', name: 'Dana Whitlock', email: 'dana@harrow-lane.example', password: DEMO_PASSWORD },
  { label: 'Office', name: 'Priscilla Ochoa', email: 'priscilla@harrow-lane.example', password: DEMO_PASSWORD },
  { label: 'Inspector', name: 'Tomas Brandt', email: 'tomas@harrow-lane.example', password: DEMO_PASSWORD },
] as const;
