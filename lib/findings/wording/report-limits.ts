/** Printed in every report, whatever was found. Own words; facts sections 3 and 6 hold the reasons. */
export const REPORT_LIMITS: readonly string[] = [
  'A lamp tester compares the three slots with each other. It cannot see a jumper in place of a ground, neutral and ground swapped, a poor joint, two faults at once, or two hot wires.',
  'Lamps that stay off do not mean that the power is off.',
  'A lamp tester does not measure how good a ground is. A ground that shows may still be poor.',
  'A plug-in tester needs a ground to trip a GFCI. Where there is none, no trip says nothing about the GFCI.',
  'The button of an AFCI shows that it trips. It does not show that it sees every kind of arc.',
  'Only the receptacles named in the log were tested. Where a sample was taken, others like them may differ.',
  'Nothing was taken apart. What is inside walls, boxes and appliances was not seen.',
  'Edition years show when the national model code first asked for this. Your town may have adopted it later, changed it, or not at all. Older work is often allowed to stay. This report is not a code-compliance inspection.',
  'Readings show the day of the inspection. Loads, weather and later work can change them.',
  'Local codes and the judgment of a licensed electrician come before anything written here.',
];
