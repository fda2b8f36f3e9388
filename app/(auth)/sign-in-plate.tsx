/** A receptacle that nobody has tested: the three lamps stand on a dotted ring, unlit and unread. */
export function SignInPlate() {
  return (
    <svg viewBox="0 0 420 420" width="420" height="420" fill="none" stroke="var(--ink)" strokeWidth="2">
      <circle cx="210" cy="210" r="150" stroke="var(--rule)" strokeDasharray="2 6" />
      <path d="M150 119h120c31 20 49 54 49 91s-18 71-49 91H150c-31-20-49-54-49-91s18-71 49-91Z" fill="var(--sheet)" />
      <path d="M60 178h98M262 178h94M210 286v74" strokeWidth="1.5" />
      <path d="M162 151h15v54h-15zM243 156h15v44h-15z" fill="var(--ink)" stroke="none" />
      <path d="M193 271v-17a17 17 0 0 1 34 0v17Z" fill="var(--ink)" stroke="none" />
      <g fill="var(--ink)" stroke="none">
        <circle cx="64" cy="178" r="6" />
        <circle cx="356" cy="178" r="6" />
        <circle cx="210" cy="360" r="6" />
      </g>
      {LAMPS.map(({ name, x, y }) => (
        <g key={name}>
          <circle cx={x} cy={y} r="30" fill="var(--paper)" stroke="var(--rule)" strokeDasharray="5 4" />
          <text x={x} y={y} {...LETTERS}>
            {name}
          </text>
        </g>
      ))}
      <text x="38" y="178" {...LETTERS}>
        N
      </text>
      <text x="382" y="178" {...LETTERS}>
        H
      </text>
      <text x="210" y="390" {...LETTERS}>
        G
      </text>
    </svg>
  );
}

const LAMPS = [
  { name: 'HN', x: 210, y: 60 },
  { name: 'NG', x: 94, y: 305 },
  { name: 'HG', x: 326, y: 305 },
];
const LETTERS = {
  fill: 'var(--ink-2)',
  stroke: 'none',
  fontSize: 23,
  fontWeight: 700,
  textAnchor: 'middle',
  dominantBaseline: 'central',
} as const;
