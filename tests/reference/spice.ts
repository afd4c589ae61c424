import { execFileSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Circuit, Fault, LiftState, Part, RelayPosition } from '@shared/circuit';

/**
 * Settled readings by ngspice (Debian's package), an independent solver: circuits are written out here
 * without any of the product's solving code, one run for each pair of probes, the meter connected.
 */
const NGSPICE = '/usr/bin/ngspice';
export const hasNgspice = existsSync(NGSPICE);

/** Ohms: what the model says of opens, leaks and earth. */
const OPEN = 1e9;
const LEAK = 1e12;
/** Steps of a cycle, and cycles before the one that is measured. */
const STEPS = 2000;
const CHARGING_CYCLES = 50;

export interface SpiceRun {
  readonly circuit: Circuit;
  readonly state: LiftState;
  readonly relays: Readonly<Record<string, RelayPosition>>;
  readonly faults: readonly Fault[];
  readonly probes: readonly (readonly [string, string])[];
  readonly meterOhms: number;
  readonly hertz: number;
  /** Siemens beside every junction. */
  readonly diodeLeak: number;
}

export interface SpiceReading {
  readonly mean: number;
  readonly rms: number;
}

/** One reading for each pair of probes. All pairs are copies of the circuit in one run. */
export function spiceReadings(run: SpiceRun): readonly SpiceReading[] {
  const folder = mkdtempSync(join(tmpdir(), 'lampline-'));
  try {
    const netlist = join(folder, 'run.cir');
    const table = join(folder, 'out.txt');
    writeFileSync(netlist, deck(run, table));
    execFileSync(NGSPICE, ['-b', netlist], { stdio: 'pipe' });
    return cycleReadings(readFileSync(table, 'utf8'), run);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function deck(run: SpiceRun, table: string): string {
  const period = 1 / run.hertz;
  const lines = ['* settled readings'];
  run.probes.forEach(([red, black], copy) => {
    const node = (tag: string) => (tag === 'earth' ? '0' : `n${copy}_${index(run.circuit, tag)}`);
    run.circuit.terminals.forEach(({ tag }, k) => {
      lines.push(`Rleak${copy}_${k} ${node(tag)} 0 ${LEAK}`);
    });
    run.circuit.parts.forEach((part, k) =>
      lines.push(...partLines(run, part, `${copy}_${k}`, node)),
    );
    for (const { part, mode, ohms } of run.faults) {
      if (mode === 'earth') lines.push(`Rearth${copy} ${node(part)} 0 ${ohms!}`);
    }
    lines.push(`Rmeter${copy} ${node(red)} ${node(black)} ${run.meterOhms}`);
    lines.push(`Eout${copy} out${copy} 0 ${node(red)} ${node(black)} 1`);
  });
  const charged = run.circuit.parts.some(({ kind }) => kind === 'capacitor');
  const cycles = charged ? CHARGING_CYCLES : 1;
  lines.push(
    '.model rectifier D(IS=1e-9 N=1.7 RS=0.05)',
    // Charge makes ngspice stumble over tolerances that do well without.
    charged
      ? `.options reltol=1e-3 abstol=1e-9 vntol=1e-4 gmin=${run.diodeLeak} itl4=200`
      : `.options reltol=1e-5 abstol=1e-11 vntol=1e-6 gmin=${run.diodeLeak} itl4=200`,
    '.control',
    `tran ${period / STEPS} ${(cycles + 1) * period} ${cycles * period} ${period / STEPS}`,
    'set wr_singlescale',
    'set wr_vecnames',
    `wrdata ${table} ${run.probes.map((_, copy) => `v(out${copy})`).join(' ')}`,
    'quit 0',
    '.endc',
    '.end',
  );
  return lines.join('\n');
}

const index = (circuit: Circuit, tag: string) =>
  circuit.terminals.findIndex((terminal) => terminal.tag === tag);

function partLines(
  { faults, state, relays, hertz }: SpiceRun,
  part: Part,
  id: string,
  node: (tag: string) => string,
): string[] {
  const own = faults.filter((fault) => fault.part === part.name && fault.mode !== 'earth');
  const broken = own.some(({ mode }) => mode === 'open' || mode === 'blown');
  const replaced = own.find(({ mode }) => mode === 'resistive')?.ohms;
  switch (part.kind) {
    case 'supply': {
      const factor = own.find(({ mode }) => mode === 'low')?.factor ?? 1;
      const [plus, minus] = part.between.map(node);
      const source =
        part.current === 'direct'
          ? `DC ${part.volts * factor}`
          : `SIN(0 ${part.volts * factor * Math.SQRT2} ${hertz})`;
      return [`V${id} s${id} ${minus} ${source}`, `R${id} s${id} ${plus} ${part.ohms}`];
    }
    case 'transformer': {
      const [p1, p2] = part.primary.map(node);
      const [s1, s2] = part.secondary.map(node);
      return [
        `E${id} t${id} ${s2} ${p1} ${p2} ${part.ratio}`,
        `Vs${id} t${id} u${id} 0`,
        `R${id} u${id} ${s1} ${part.ohms}`,
        `F${id} ${p1} ${p2} Vs${id} ${part.ratio}`,
      ];
    }
    case 'bridge': {
      const [a1, a2, plus, minus] = part.between.map(node);
      const legs = [
        [a1, plus],
        [a2, plus],
        [minus, a1],
        [minus, a2],
      ];
      return legs.map(([anode, cathode], k) =>
        own.some(({ mode, diode }) => mode === 'diode open' && diode === k + 1)
          ? `R${id}_${k} ${anode} ${cathode} ${OPEN}`
          : `D${id}_${k} ${anode} ${cathode} rectifier`,
      );
    }
    case 'capacitor':
      return [`C${id} ${part.between.map(node).join(' ')} ${part.farads} ic=0`];
    case 'contact': {
      const { condition, relay } = part;
      const closed =
        (!condition || condition.closedWhen.includes(state[condition.name]!)) &&
        (!relay || (relays[relay.name] === 'in') === (relay.closedWhen === 'in'));
      const ohms = broken || !closed ? OPEN : (replaced ?? part.ohms);
      return [`R${id} ${part.between.map(node).join(' ')} ${ohms}`];
    }
    default:
      return [
        `R${id} ${part.between.map(node).join(' ')} ${broken ? OPEN : (replaced ?? part.ohms)}`,
      ];
  }
}

/** Mean and RMS over the last cycle, by trapezoids over ngspice's own (uneven) steps. */
function cycleReadings(table: string, { probes }: SpiceRun): readonly SpiceReading[] {
  const rows = table
    .trim()
    .split('\n')
    .slice(1)
    .map((line) => line.trim().split(/\s+/).map(Number));
  return probes.map((_, copy) => {
    let time = 0;
    let sum = 0;
    let squares = 0;
    for (let j = 1; j < rows.length; j++) {
      const step = rows[j]![0]! - rows[j - 1]![0]!;
      const a = rows[j - 1]![copy + 1]!;
      const b = rows[j]![copy + 1]!;
      time += step;
      sum += (step * (a + b)) / 2;
      squares += (step * (a * a + a * b + b * b)) / 3;
    }
    return { mean: sum / time, rms: Math.sqrt(squares / time) };
  });
}
