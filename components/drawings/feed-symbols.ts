import type { DeviceKind, SlotPattern } from '@/lib/findings/vocabulary';
import { buttonDeviceDrawing, faceDrawing, hasButtons } from './face';
import { mm, type Shape } from './shapes';

export type FeedNode = {
  kind: 'panel' | 'breaker' | 'receptacle' | 'hardwired';
  name: string;
  note: string;
  pattern?: SlotPattern;
  device?: DeviceKind;
  /** No power now: tripped, switched off or locked out. */
  off?: boolean;
  feeds: FeedNode[];
};

/** Half the width that a symbol takes on its wire. */
export function reachOf(node: FeedNode, size: number): number {
  if (node.kind === 'panel') return size * 0.36;
  if (node.kind === 'hardwired') return size * 0.36;
  return isTall(node) ? size * 0.34 : size / 2;
}

/** Half the height of a symbol. */
export function dropOf(node: FeedNode, size: number): number {
  if (node.kind === 'breaker') return size * 0.3;
  return isTall(node) ? size * 0.64 : size / 2;
}

export function isTall(node: FeedNode): boolean {
  return node.kind === 'receptacle' && hasButtons(node.device);
}

/** The symbol of a node around its own middle, `size` high; a GFCI a little higher. */
export function symbolShapes(node: FeedNode, size: number): Shape[] {
  switch (node.kind) {
    case 'panel':
      return panelShapes(size);
    case 'breaker':
      return breakerShapes(size);
    case 'hardwired':
      return hardwiredShapes(size);
    case 'receptacle': {
      const drawing = isTall(node)
        ? buttonDeviceDrawing(node.device ?? 'gfci-receptacle', node.off)
        : faceDrawing(node.pattern ?? '5-15R', node.off);
      const height = isTall(node) ? size * 1.28 : size;
      // The words on the buttons would be too small to read.
      const shapes = drawing.shapes.filter(({ kind }) => kind !== 'text');
      return [{ kind: 'group', x: 0, y: 0, scale: mm(height / drawing.box[3]), shapes }];
    }
  }
}

function panelShapes(s: number): Shape[] {
  const rows = [-0.3, -0.1, 0.1, 0.3].map(
    (y) => `M${mm(-s * 0.2)} ${mm(s * y)}h${mm(s * 0.16)}m${mm(s * 0.08)} 0h${mm(s * 0.16)}`,
  );
  return [
    { kind: 'rect', role: 'symbol', x: mm(-s * 0.36), y: mm(-s / 2), width: mm(s * 0.72), height: s, rx: 1.5 },
    { kind: 'path', role: 'symbol-line', d: rows.join('') },
  ];
}

function breakerShapes(s: number): Shape[] {
  const x = mm(s * 0.28);
  return [
    { kind: 'rect', role: 'symbol', x: mm(-s / 2), y: mm(-s * 0.3), width: s, height: mm(s * 0.6), rx: 1.5 },
    { kind: 'circle', role: 'dot', cx: -x, cy: 0, r: 2.4 },
    { kind: 'circle', role: 'dot', cx: x, cy: 0, r: 2.4 },
    { kind: 'path', role: 'symbol-line', d: `M${-x} 0A${mm(s * 0.3)} ${mm(s * 0.3)} 0 0 1 ${x} 0` },
  ];
}

function hardwiredShapes(s: number): Shape[] {
  const a = mm(s * 0.25);
  return [
    { kind: 'circle', role: 'symbol', cx: 0, cy: 0, r: mm(s * 0.36) },
    { kind: 'path', role: 'symbol-line', d: `M${-a} ${-a}L${a} ${a}M${a} ${-a}L${-a} ${a}` },
  ];
}
