import { ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';

/** A receptacle that nobody has tested: the three lamps stand on a dotted ring, unlit and unread. */
export function SignInPlate() {
  return <ReceptacleDrawing view="reading" pattern="5-15R" size={420} label="A receptacle that was not tested" />;
}
