import { drawingOf } from '@/components/drawings/receptacle-drawing';
import type { Drawing as Shapes } from '@/components/drawings/shapes';
import type { SnapshotFinding } from '@/lib/schemas/snapshot';
import { PdfReceptacle } from './pdf-receptacle';

type Drawing = NonNullable<SnapshotFinding['drawing']>;

/** What was read: three lamps or volts on a ring around the face; the device itself where neither was read. */
export function ReadingDrawing({ drawing, width }: { drawing: Drawing; width: number }) {
  return <Fitted drawing={readingOf(drawing, width)} width={width} />;
}

/** What that most often means: the conductors behind the face. */
export function WiresDrawing({ drawing, width }: { drawing: Drawing; width: number }) {
  if (!drawing.condition) return null;
  const { pattern, condition } = drawing;
  return <Fitted drawing={drawingOf({ view: 'wiring', pattern, condition })} width={width} />;
}

/** A ring without a reading, for the cover. */
export function EmptyRing({ width }: { width: number }) {
  return <PdfReceptacle drawing={drawingOf({ view: 'reading', pattern: '5-15R' })} width={width} />;
}

function readingOf({ pattern, device, lamps, volts }: Drawing, width: number) {
  if (!lamps && !volts) return drawingOf({ view: 'face', pattern, device });
  return drawingOf({ view: 'reading', pattern, device, ...(lamps ? { lamps } : { volts }) }, width);
}

/** Within a square of that width, whatever its shape. */
function Fitted({ drawing, width }: { drawing: Shapes; width: number }) {
  const [, , boxWidth, boxHeight] = drawing.box;
  return <PdfReceptacle drawing={drawing} width={boxHeight > boxWidth ? (width * boxWidth) / boxHeight : width} />;
}
