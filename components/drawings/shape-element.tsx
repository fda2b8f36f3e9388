import { LOOKS, type Shape } from './shapes';

/** One shape on the page. `line` is the drawing's line weight in the units of the shape. */
export function ShapeElement({ shape, line }: { shape: Shape; line: number }) {
  if (shape.kind === 'group')
    return (
      <g transform={`translate(${shape.x} ${shape.y}) scale(${shape.scale})`}>
        {shape.shapes.map((part, i) => (
          <ShapeElement key={i} shape={part} line={line / shape.scale} />
        ))}
      </g>
    );
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
          fontWeight={look.light ? 400 : 700}
          textAnchor={shape.start ? 'start' : 'middle'}
          fill={paint.fill}
        >
          {shape.words}
        </text>
      );
  }
}
