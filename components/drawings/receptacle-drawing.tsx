import type { DeviceKind, SlotPattern, WiringCondition } from '@/lib/findings/vocabulary';
import { buttonDeviceDrawing, faceDrawing, hasButtons } from './face';
import { readingDrawing, type Ring } from './reading';
import { LOOKS, type Drawing, type Shape } from './shapes';
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

function ShapeElement({ shape, line }: { shape: Shape; line: number }) {
  const look = LOOKS[shape.role];
  const width = look.mm ?? (look.line ?? 1) * line;
  const dash = look.dash?.map((part) => (look.mm ? part : part * line)).join(' ');
  const paint = {
    fill: look.fill ? `var(--${look.fill})` : 'none',
    stroke: look.stroke ? `var(--${look.stroke})` : 'none',
    style: look.stroke ? { strokeWidth: look.mm ? width : `calc(${width}px * var(--thick))` } : undefined,
    strokeDasharray: dash,
    strokeLinecap: look.butt ? ('butt' as const) : ('round' as const),
    strokeLinejoin: 'round' as const,
  };
  switch (shape.kind) {
    case 'path':
      return (
        <path
          {...paint}
          d={shape.d}
          transform={shape.turn && `rotate(${shape.turn.degrees} ${shape.turn.x} ${shape.turn.y})`}
        />
      );
    case 'circle':
      return <circle {...paint} cx={shape.cx} cy={shape.cy} r={shape.r} />;
    case 'rect':
      return <rect {...paint} x={shape.x} y={shape.y} width={shape.width} height={shape.height} rx={shape.rx} />;
    case 'text':
      return (
        <text
          aria-hidden="true"
          x={shape.x}
          y={shape.y}
          fontSize={shape.size}
          fontWeight={700}
          textAnchor="middle"
          fill={paint.fill}
        >
          {shape.words}
        </text>
      );
  }
}
