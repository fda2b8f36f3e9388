import type { DeviceKind, SlotPattern } from '@/lib/findings/vocabulary';
import { FACES, type Face, type Slot } from './geometry';
import { mm, type Drawing, type Shape } from './shapes';

/** From the middle of the bar: 0.290 in over all, less half a bar. */
const TEE_ARM = 6.42;
const ELL_FOOT = 4.6;

function slotPath({ shape, x, y, width: w, height: h }: Slot): string {
  const bar = `M${mm(x - w / 2)} ${mm(y - h / 2)}h${w}v${h}h${-w}z`;
  switch (shape) {
    case 'blade':
      return bar;
    case 'tee-left':
      return `${bar}M${mm(x - TEE_ARM)} ${mm(y - w / 2)}h${TEE_ARM}v${w}h${-TEE_ARM}z`;
    case 'tee-right':
      return `${bar}M${mm(x)} ${mm(y - w / 2)}h${TEE_ARM}v${w}h${-TEE_ARM}z`;
    case 'ell':
      return `M${mm(x - w / 2)} ${mm(y - h / 2)}h${w}v${mm(h - w)}h${ELL_FOOT}v${w}h${mm(-w - ELL_FOOT)}z`;
    case 'arch': {
      const r = w / 2;
      return `M${mm(x - r)} ${mm(y + h / 2)}v${mm(-h / 2)}a${r} ${r} 0 0 1 ${w} 0v${mm(h / 2)}z`;
    }
  }
}

export function slotShapes(face: Face, dead = false, dy = 0): Shape[] {
  return face.slots.map((slot) => {
    const moved = { ...slot, y: slot.y + dy };
    const turn = slot.turn ? { degrees: slot.turn, x: moved.x, y: moved.y } : undefined;
    return { kind: 'path', role: dead ? 'slot-dead' : 'slot', d: slotPath(moved), turn };
  });
}

export function outlineShape(face: Face, dead = false): Shape {
  const role = dead ? 'face-dead' : 'face';
  if (face.outline === 'round') return { kind: 'circle', role, cx: 0, cy: 0, r: face.radius };
  const x = mm(Math.sqrt(face.radius ** 2 - face.flat ** 2));
  const { radius: r, flat: y } = face;
  return { kind: 'path', role, d: `M${-x} ${-y}H${x}A${r} ${r} 0 0 1 ${x} ${y}H${-x}A${r} ${r} 0 0 1 ${-x} ${-y}z` };
}

/** Whether the face is the flat rectangle of a device with buttons. */
export function hasButtons(device: DeviceKind | undefined): boolean {
  return device === 'gfci-receptacle' || device === 'afci-receptacle' || device === 'dual-function-receptacle';
}

/** Half of a device with buttons, as wide as the opening of its cover plate. */
export const RECTANGLE: Shape = { kind: 'rect', role: 'face', x: -16.65, y: -14.3, width: 33.3, height: 28.6, rx: 1.2 };

/** The bare face; a dead one is dashed and struck through. */
export function faceDrawing(pattern: SlotPattern, dead = false): Drawing {
  const face = FACES[pattern];
  const margin = face.outline === 'round' ? 29 : 18.6;
  const strike: Shape[] = dead ? [{ kind: 'path', role: 'strike', d: 'M-13 12L13 -13' }] : [];
  return {
    box: [-margin, -margin, 2 * margin, 2 * margin],
    shapes: [outlineShape(face, dead), ...slotShapes(face, dead), ...strike],
    label: `${pattern} receptacle${dead ? ', face dead' : ''}`,
  };
}

/** A device with buttons as a whole. `pressed` is the button that is being pushed. */
export function buttonDeviceDrawing(device: DeviceKind, dead = false, pressed?: 'test' | 'reset'): Drawing {
  const face = FACES['5-15R'];
  const half = (dy: number): Shape[] => [
    ...slotShapes(face, dead, dy),
    ...(dead ? [{ kind: 'path', role: 'strike', d: `M-12 ${10 + dy}L12 ${-11 + dy}` } satisfies Shape] : []),
  ];
  const outline = dead ? 'face-dead' : 'face';
  return {
    box: [-19, -36, 38, 72],
    shapes: [
      { kind: 'rect', role: outline, x: -16.65, y: -33.4, width: 33.3, height: 66.8, rx: 1.2 },
      ...half(-19.4),
      ...half(19.4),
      ...button(-14, 'TEST', pressed === 'test'),
      ...button(1, 'RESET', pressed === 'reset'),
      { kind: 'circle', role: dead ? 'pilot' : 'pilot-on', cx: 13.6, cy: 29.8, r: 1.1 },
    ],
    label: [DEVICE_NAME[device], pressed && `${pressed.toUpperCase()} pressed`, dead && 'face dead']
      .filter(Boolean)
      .join(', '),
  };
}

const DEVICE_NAME: Record<DeviceKind, string> = {
  receptacle: 'Receptacle',
  'gfci-receptacle': 'GFCI receptacle',
  'afci-receptacle': 'AFCI receptacle',
  'dual-function-receptacle': 'Receptacle with GFCI and AFCI',
  'hard-wired-outlet': 'Hard-wired outlet',
};

function button(x: number, words: string, pressed: boolean): Shape[] {
  return [
    { kind: 'rect', role: pressed ? 'button-pressed' : 'button', x, y: -5, width: 13, height: 10, rx: 1 },
    { kind: 'text', role: pressed ? 'button-pressed-text' : 'button-text', x: x + 6.5, y: 1.2, size: 3.3, words },
  ];
}
