import type { DeviceKind, SlotPattern, WiringCondition } from '@/lib/findings/vocabulary';
import { buttonDeviceDrawing, faceDrawing, hasButtons } from './face';
import { readingDrawing, type Ring } from './reading';
import { ShapeElement } from './shape-element';
import type { Drawing } from './shapes';
import { wiringDrawing } from './wiring';

type View =
  | { view: 'face'; dead?: boolean; device?: DeviceKind; pressed?: 'test' | 'reset' }
  | ({ view: 'reading' | 'pad' } & Pick<Ring, 'lamps' | 'volts' | 'device'>)
  | { view: 'wiring'; condition: WiringCondition };
type ReceptacleDrawingProps = { pattern: SlotPattern; size: number; label?: string } & View;

/** The receptacle: its face, what was read on a ring around it, or the wires that the reading most often means. */
export function ReceptacleDrawing({ size, label, ...what }: ReceptacleDrawingProps) {
  const drawing = drawingOf(what, size);
  const [x, y, width, height] = drawing.box;
  const scale = height / size;
  const line = (size < 80 ? 1.4 : size < 200 ? 1.5 : 2) * scale;
  return (
    <svg
      role="img"
      aria-label={label ?? drawing.label}
      viewBox={`${x} ${y} ${width} ${height}`}
      width={(size * width) / height}
      height={size}
      className="rc mx-auto max-w-full overflow-visible font-sans"
    >
      {drawing.shapes.map((shape, i) => (
        <ShapeElement key={i} shape={shape} line={line} />
      ))}
    </svg>
  );
}

/** The shapes of one view. `size` is its height in pixels or points: what would be too small to read is left out. */
export function drawingOf(what: { pattern: SlotPattern } & View, size?: number): Drawing {
  switch (what.view) {
    case 'face':
      return what.device && hasButtons(what.device)
        ? buttonDeviceDrawing(what.device, what.dead, what.pressed)
        : faceDrawing(what.pattern, what.dead);
    case 'reading':
      return readingDrawing({ ...what, size });
    case 'pad':
      return readingDrawing({ ...what, pad: true });
    case 'wiring':
      return wiringDrawing(what.pattern, what.condition);
  }
}
