import { Matrix, solve } from 'ml-matrix';

/**
 * L1 and L2 are the legs of the supply, E its earthed neutral point, P the bonded neutral and ground bar of the panel;
 * H, N and G are the slots.
 */
export type CircuitNode = 'L1' | 'L2' | 'E' | 'P' | 'H' | 'N' | 'G';
/** V rms, with phase. */
export type Phasor = { re: number; im: number };
export type Branch =
  { a: CircuitNode; b: CircuitNode; ohms: number } | { a: CircuitNode; b: CircuitNode; farads: number };
export type Circuit = {
  /** Nodes held at a potential against earth. */
  sources: Partial<Record<CircuitNode, Phasor>>;
  branches: readonly Branch[];
};
export type Potentials = Partial<Record<CircuitNode, Phasor>>;

const MAINS_HERTZ = 60;

/** X = 1 / (2 pi f C), in ohms, of a capacitance in farads at a frequency in hertz. */
export function capacitiveReactanceOhms(farads: number, hertz: number = MAINS_HERTZ): number {
  return 1 / (2 * Math.PI * hertz * farads);
}

/** |Va - Vb| in V rms. A node that the circuit does not have counts as earth. */
export function voltsBetween(potentials: Potentials, a: CircuitNode, b: CircuitNode): number {
  const from = potentials[a] ?? EARTH;
  const to = potentials[b] ?? EARTH;
  return Math.hypot(from.re - to.re, from.im - to.im);
}

const EARTH: Phasor = { re: 0, im: 0 };

/**
 * Node potentials in V rms at 60 Hz by nodal analysis: Y v = i with Y = G + jB, written as the real system of twice the
 * size [G -B; B G]. Sources are known potentials and move to the right-hand side. Throws where a node hangs on nothing.
 */
export function solveCircuit(circuit: Circuit): Potentials {
  return solvePorts(circuit, []).open;
}

/** With nothing attached, and what one ampere into each port does with the sources at rest (so, ohms). */
export type Ports = { open: Potentials; driven: Partial<Record<CircuitNode, Potentials>> };

/** As `solveCircuit`, with one factorization for the open circuit and every port: what Thévenin needs. */
export function solvePorts({ sources, branches }: Circuit, ports: readonly CircuitNode[]): Ports {
  const unknown = unknownNodes(branches, sources);
  const size = unknown.length;
  const matrix = Matrix.zeros(2 * size, 2 * size);
  const right = Matrix.zeros(2 * size, 1 + ports.length);
  const row = new Map(unknown.map((node, index) => [node, index]));
  for (const branch of branches) stamp(branch, { matrix, right, row, sources });
  for (const [index, port] of ports.entries()) {
    const i = row.get(port);
    if (i !== undefined) add(right, i, 1 + index, 1);
  }
  const solution = solve(matrix, right);
  const column = (index: number) =>
    Object.fromEntries(
      unknown.map((node, i) => [node, { re: solution.get(i, index), im: solution.get(size + i, index) }]),
    );
  return {
    open: { ...sources, ...column(0) },
    driven: Object.fromEntries(ports.map((port, index) => [port, column(1 + index)])),
  };
}

type System = { matrix: Matrix; right: Matrix; row: ReadonlyMap<CircuitNode, number>; sources: Circuit['sources'] };

function stamp(branch: Branch, { matrix, right, row, sources }: System): void {
  const admittance = admittanceOf(branch);
  const size = matrix.rows / 2;
  for (const [here, there] of [
    [branch.a, branch.b],
    [branch.b, branch.a],
  ] as const) {
    const i = row.get(here);
    if (i === undefined) continue;
    addAdmittance(matrix, size, i, i, admittance, 1);
    const j = row.get(there);
    if (j === undefined) addKnown(right, size, i, admittance, sources[there] ?? EARTH);
    else addAdmittance(matrix, size, i, j, admittance, -1);
  }
}

function unknownNodes(branches: readonly Branch[], sources: Circuit['sources']): CircuitNode[] {
  const nodes = new Set(branches.flatMap((branch) => [branch.a, branch.b]));
  return [...nodes].filter((node) => node !== 'E' && sources[node] === undefined);
}

function admittanceOf(branch: Branch): Phasor {
  if ('ohms' in branch) return { re: 1 / branch.ohms, im: 0 };
  return { re: 0, im: 1 / capacitiveReactanceOhms(branch.farads) };
}

function addAdmittance(matrix: Matrix, size: number, i: number, j: number, { re, im }: Phasor, sign: 1 | -1): void {
  add(matrix, i, j, sign * re);
  add(matrix, size + i, size + j, sign * re);
  add(matrix, i, size + j, -sign * im);
  add(matrix, size + i, j, sign * im);
}

function addKnown(right: Matrix, size: number, i: number, admittance: Phasor, volts: Phasor): void {
  add(right, i, 0, admittance.re * volts.re - admittance.im * volts.im);
  add(right, size + i, 0, admittance.re * volts.im + admittance.im * volts.re);
}

function add(matrix: Matrix, i: number, j: number, value: number): void {
  matrix.set(i, j, matrix.get(i, j) + value);
}
