import { Circle, G, Path, Rect, Svg, Text } from '@react-pdf/renderer';
import { LOOKS, type Drawing, type Shape, type Token } from '@/components/drawings/shapes';
import { SANS } from './report-styles';

/** Paper is white in print; the rest are the light theme's values. */
const INK: Record<Token, string> = {
  ink: '#1d1a15',
  'ink-2': '#5c5548',
  paper: '#ffffff',
  'paper-2': '#f3efe6',
  sheet: '#ffffff',
  rule: '#8a806e',
  brass: '#a97d1e',
  silver: '#828a91',
  green: '#2f6b4a',
  'on-metal': '#1d1a15',
  inverse: '#1d1a15',
  'on-inverse': '#ffffff',
};
const LINE_POINTS = 0.75;

/** The same geometry as on screen, in the PDF's own primitives. `width` in points. */
export function PdfReceptacle({ drawing, width }: { drawing: Drawing; width: number }) {
  const [x, y, boxWidth, boxHeight] = drawing.box;
  const line = (LINE_POINTS * boxWidth) / width;
  return (
    <Svg viewBox={`${x} ${y} ${boxWidth} ${boxHeight}`} style={{ width, height: (width * boxHeight) / boxWidth }}>
      {drawing.shapes.map((shape, i) => (
        <PdfShape key={i} shape={shape} line={line} />
      ))}
    </Svg>
  );
}

function PdfShape({ shape, line }: { shape: Shape; line: number }) {
  if (shape.kind === 'group')
    return (
      <G transform={`translate(${shape.x} ${shape.y}) scale(${shape.scale})`}>
        {shape.shapes.map((part, i) => (
          <PdfShape key={i} shape={part} line={line / shape.scale} />
        ))}
      </G>
    );
  const look = LOOKS[shape.role];
  const paint = {
    fill: look.fill ? INK[look.fill] : 'none',
    stroke: look.stroke ? INK[look.stroke] : 'none',
    strokeWidth: look.stroke ? (look.mm ?? (look.line ?? 1) * line) : 0,
    strokeDasharray: look.dash?.map((part) => Math.max(look.mm ? part : part * line, 0.01)).join(','),
    strokeLinecap: look.butt ? ('butt' as const) : ('round' as const),
    strokeLinejoin: 'round' as const,
  };
  switch (shape.kind) {
    case 'path':
      return (
        <Path
          {...paint}
          d={shape.d}
          transform={shape.turn && `rotate(${shape.turn.degrees} ${shape.turn.x} ${shape.turn.y})`}
        />
      );
    case 'circle':
      return <Circle {...paint} cx={shape.cx} cy={shape.cy} r={shape.r} />;
    case 'rect':
      return (
        <Rect
          {...paint}
          x={shape.x}
          y={shape.y}
          width={shape.width}
          height={shape.height}
          rx={shape.rx}
          ry={shape.rx}
        />
      );
    case 'text':
      return (
        <Text
          x={shape.x}
          y={shape.y}
          textAnchor={shape.start ? 'start' : 'middle'}
          fill={paint.fill}
          style={{ fontFamily: SANS, fontWeight: look.light ? 400 : 700, fontSize: shape.size }}
        >
          {shape.words}
        </Text>
      );
  }
}
