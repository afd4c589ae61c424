import { readFileSync } from 'node:fs';
import { singleFaults, stringCircuit, type Circuit, type Fault } from '@shared/circuit';
import { solve } from '@shared/solver';
import { huntCircuit, type HuntCircuit } from '../reference/huntCircuit';
import { hasNgspice, spiceReadings } from '../reference/spice';

/**
 * Milliseconds for one fault of a circuit: solving it, and reading every terminal against the return with
 * the meter connected. Beside it, in the same run, ngspice once per fault (without any reading).
 * Run: npx tsx tests/bench/solver.bench.ts
 */
const METER = 10e6;
const ROUNDS = 3;
/** Faults that ngspice is timed on: it takes long. */
const SPICE_FAULTS = 12;

const file = new URL('../reference/data/reference.json', import.meta.url);
const { circuits } = JSON.parse(readFileSync(file, 'utf8')) as { circuits: HuntCircuit[] };

const sixty = stringCircuit(
  `124 V bridge earthed: ${Array.from({ length: 53 }, (_, k) => {
    const coil = k === 30 ? '[SR 3300 ohm] ' : '';
    return `T${k} ${coil}${k % 2 ? `~wire ${k} 0.2 ohm~` : `(contact ${k} 0.1 ohm)`}`;
  }).join(' ')} T53 [LR 3300 ohm]`,
);

const smoothed: Circuit = {
  ...sixty,
  parts: [
    ...sixty.parts,
    {
      kind: 'capacitor',
      name: 'smoothing',
      place: 'controller',
      weight: 1,
      between: ['S', 'N'],
      farads: 1e-4,
    },
  ],
};

interface Figures {
  readonly faults: number;
  readonly solveMs: number;
  readonly readMs: number;
  readonly worstMs: number;
}

function measure(circuit: Circuit, faults: readonly Fault[]): Figures {
  const tags = circuit.terminals.map(({ tag }) => tag);
  let solveMs = 0;
  let readMs = 0;
  let worstMs = 0;
  for (const fault of faults) {
    const start = performance.now();
    const solution = solve(circuit, {}, [fault]);
    const solved = performance.now();
    for (const red of tags) solution.read({ red, black: 'R', meterOhms: METER });
    const end = performance.now();
    solveMs += solved - start;
    readMs += end - solved;
    worstMs = Math.max(worstMs, end - start);
  }
  return {
    faults: faults.length,
    solveMs: solveMs / faults.length,
    readMs: readMs / faults.length,
    worstMs,
  };
}

function spiceMs(circuit: Circuit, faults: readonly Fault[]): number {
  const supported = faults.filter(({ mode }) => ['open', 'blown', 'resistive'].includes(mode));
  const step = Math.ceil(supported.length / SPICE_FAULTS);
  const timed = supported.filter((_, k) => k % step === 0);
  const start = performance.now();
  for (const fault of timed) {
    const { relays } = solve(circuit, {}, [fault]);
    spiceReadings({
      circuit,
      state: {},
      relays,
      faults: [fault],
      probes: [['R', 'R']],
      meterOhms: METER,
      hertz: 50,
      // With charge in the circuit ngspice gets through a cycle only with more leak at the junctions.
      diodeLeak: circuit.parts.some(({ kind }) => kind === 'capacitor') ? 1e-9 : 1e-12,
    });
  }
  return (performance.now() - start) / timed.length;
}

const out = (line: string) => process.stdout.write(`${line}\n`);
const ms = (value: number) => `${value.toFixed(3)} ms`;

for (const [name, circuit] of [
  ['REF-A, rectified', huntCircuit(circuits[0]!)],
  ['REF-B, AC with capacitors', huntCircuit(circuits[1]!)],
  ['REF-C, DC unearthed', huntCircuit(circuits[2]!)],
  ['60 parts, rectified', sixty],
  ['61 parts, rectified and smoothed', smoothed],
] as const) {
  const faults = singleFaults(circuit).map(({ fault }) => fault);
  let figures = measure(circuit, faults);
  for (let round = 1; round < ROUNDS; round++) figures = measure(circuit, faults);
  const { solveMs, readMs, worstMs } = figures;
  out(`${name}: ${circuit.parts.length} parts, ${circuit.terminals.length} terminals`);
  out(`  per fault, of ${faults.length}: ${ms(solveMs + readMs)} (solving ${ms(solveMs)}, reading`);
  out(`  all terminals ${ms(readMs)}), slowest ${ms(worstMs)}`);
  out(`  ngspice once per fault: ${hasNgspice ? ms(spiceMs(circuit, faults)) : 'not installed'}`);
}
