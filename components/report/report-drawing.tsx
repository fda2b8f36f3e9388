import { View } from '@react-pdf/renderer';
import type { SnapshotFinding } from '@/lib/schemas/snapshot';

type Drawing = NonNullable<SnapshotFinding['drawing']>;

/** What was read: three lamps or volts on a ring around the face. */
export function ReadingDrawing({ drawing, width }: { drawing: Drawing; width: number }) {
  return <View style={{ width, height: width }} id={drawing.pattern} />;
}

/** What that most often means: the conductors behind the face. */
export function WiresDrawing({ drawing, width }: { drawing: Drawing; width: number }) {
  return <View style={{ width, height: width }} id={drawing.pattern} />;
}
