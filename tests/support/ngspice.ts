import { spawnSync } from 'node:child_process';

/** Part of a circuit as SPICE has it: kind, two nodes, value in ohms or farads. Node 0 is earth. */
export type SpicePart = readonly [kind: 'R' | 'C', a: string, b: string, value: number];
export type SpiceSource = readonly [node: string, volts: number, degrees: number];
export type SpiceRun = { name: string; parts: readonly SpicePart[]; probes: readonly (readonly [string, string])[] };

/**
 * Runs `ngspice -b` with one AC point at 60 Hz. Every run is a copy of its own of the circuit, with its sources, in one
 * netlist. Gives |Va - Vb| in V rms for each probe, in order. Throws where ngspice is missing or a value is.
 */
export function runSpice(sources: readonly SpiceSource[], runs: readonly SpiceRun[]): Record<string, number[]> {
  const lines = ['* receptacle', '.options rshunt=1e13'];
  const prints: string[] = [];
  for (const [copy, run] of runs.entries()) {
    const node = (name: string) => (name === '0' ? '0' : `${name}_${copy}`);
    for (const [name, volts, degrees] of sources) lines.push(`V${name}_${copy} ${node(name)} 0 AC ${volts} ${degrees}`);
    for (const [index, [kind, a, b, value]] of run.parts.entries())
      lines.push(`${kind}${copy}_${index} ${node(a)} ${node(b)} ${value}`);
    for (const [index, [a, b]] of run.probes.entries()) {
      const of = (name: string) => (name === '0' ? '0' : `v(${node(name)})`);
      prints.push(`let p${copy}_${index} = mag(${of(a)} - ${of(b)})`, `print p${copy}_${index}`);
    }
  }
  lines.push('.control', 'ac lin 1 60 60', ...prints, 'quit', '.endc', '.end');
  const { stdout, error } = spawnSync('ngspice', ['-b'], { input: `${lines.join('\n')}\n`, encoding: 'utf8' });
  if (error) throw new Error('ngspice did not run; install it with: apt-get install ngspice', { cause: error });
  return Object.fromEntries(
    runs.map((run, copy) => [run.name, run.probes.map((_, index) => valueOf(stdout, `p${copy}_${index}`))]),
  );
}

function valueOf(output: string, name: string): number {
  const found = output.match(new RegExp(`^${name} = (\\S+)`, 'm'))?.[1];
  if (found === undefined) throw new Error(`ngspice printed no ${name}:\n${output}`);
  return Number(found);
}
