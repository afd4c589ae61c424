import { stringCircuit, type Circuit, type Fault, type Part } from '@shared/circuit';

/** Numbers from 0 to 1 out of a seed: mulberry32 (T. Ettinger, public domain), the same for the same seed. */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

export interface RandomLift {
  readonly circuit: Circuit;
  readonly faults: readonly Fault[];
  readonly probes: readonly (readonly [string, string])[];
}

const KINDS = [
  'DC',
  'AC',
  'bridge',
  'bridge last',
  'fed bridge',
  'AC with cable',
  'smoothed bridge',
] as const;

/** A string of 8 to 20 parts with one to three coils, a fault in most, and pairs of probes. */
export function randomLift(seed: number): RandomLift {
  const next = seeded(seed);
  const between = (low: number, high: number) => low + (high - low) * next();
  const whole = (low: number, high: number) => Math.floor(between(low, high + 1));
  const pick = <T>(list: readonly T[]): T => list[whole(0, list.length - 1)]!;
  const kind = KINDS[seed % KINDS.length]!;

  const length = whole(8, 20);
  const relayFed = kind === 'bridge' && next() < 0.5;
  const body = Array.from({ length }, (_, k) => {
    const ohms = between(0.02, 1.2).toFixed(3);
    const part = next() < 0.3 ? `~core ${k} ${ohms} ohm~` : `(contact ${k} ${ohms} ohm)`;
    const early = k === Math.floor(length / 2) ? `[SR ${whole(500, 4000)} ohm] ` : '';
    const hold = relayFed && k === Math.floor(length / 2) + 1 ? '(hold when SR=in) H ' : '';
    return `T${k} ${early}${hold}${part}`;
  });
  const current =
    kind.startsWith('AC') || kind === 'bridge last' ? 'AC' : kind === 'DC' ? 'DC' : 'bridge';
  const volts = pick([48, 60, 110, 125, 220]);
  const earthed = kind === 'DC' && next() < 0.4 ? '' : ' earthed';
  const head = `${volts} V ${current}${earthed}`;
  const line = stringCircuit(`${head}: ${body.join(' ')} T${length} [LR ${whole(500, 4000)} ohm]`);
  const circuit = extended(line, kind, length, between);

  const candidates = circuit.parts.filter(
    ({ kind: each }) => each === 'contact' || each === 'core',
  );
  const fault = (): Fault => {
    const roll = next();
    if (roll < 0.5) return { part: pick(candidates).name, mode: 'open' };
    if (roll < 0.75) {
      return { part: pick(candidates).name, mode: 'resistive', ohms: 10 ** between(1, 4) };
    }
    if (roll < 0.85) return { part: 'supply', mode: 'low', factor: between(0.4, 0.95) };
    if (roll < 0.93)
      return { part: pick(circuit.terminals).tag, mode: 'earth', ohms: between(1, 20) };
    if (circuit.parts.some(({ name }) => name === 'bridge')) {
      return { part: 'bridge', mode: 'diode open', diode: pick([1, 2, 3, 4] as const) };
    }
    return { part: 'return wire', mode: 'open' };
  };
  const tags = circuit.terminals.map(({ tag }) => tag);
  return {
    circuit,
    faults: next() < 0.2 ? [] : next() < 0.2 ? [fault(), fault()] : [fault()],
    probes: Array.from({ length: 6 }, (_, k): readonly [string, string] => [
      pick(tags),
      k < 3 ? 'R' : pick(tags),
    ]),
  };
}

function extended(
  line: Circuit,
  kind: (typeof KINDS)[number],
  length: number,
  between: (low: number, high: number) => number,
): Circuit {
  const at = { place: 'controller', weight: 1 };
  const terminal = (tag: string) => ({ ...line.terminals[0]!, tag });
  const last = `T${length}`;
  if (kind === 'bridge last') {
    return {
      ...line,
      terminals: [...line.terminals, terminal('P'), terminal('M')],
      parts: [
        ...line.parts.map((part): Part =>
          part.kind === 'coil' && part.between[0] === last
            ? { ...part, between: ['P', 'M'], current: 'direct' }
            : part,
        ),
        { ...at, kind: 'bridge', name: 'bridge', between: [last, 'R', 'P', 'M'] },
      ],
    };
  }
  if (kind === 'fed bridge') {
    return {
      ...line,
      terminals: [...line.terminals, terminal('L1'), terminal('L2')],
      parts: [
        ...line.parts.map((part): Part =>
          part.kind === 'supply' ? { ...part, between: ['L1', 'L2'], volts: part.volts * 2 } : part,
        ),
        {
          ...at,
          kind: 'transformer',
          name: 'control transformer',
          primary: ['L1', 'L2'],
          secondary: ['AC1', 'AC2'],
          ratio: 0.5,
          ohms: between(0.5, 4),
        },
      ],
    };
  }
  if (kind === 'smoothed bridge') {
    const farads = between(2e-5, 3e-4);
    return {
      ...line,
      parts: [
        ...line.parts,
        { ...at, kind: 'capacitor', name: 'smoothing', between: ['S', 'N'], farads },
        { ...at, kind: 'capacitor', name: 'suppressor', between: ['T3', 'R'], farads: 1e-7 },
      ],
    };
  }
  if (kind === 'AC with cable') {
    const tag = `T${Math.floor(length / 2)}`;
    const farads = () => between(1e-9, 2e-8);
    return {
      ...line,
      parts: [
        ...line.parts,
        { ...at, kind: 'capacitor', name: 'core to core', between: ['S', tag], farads: farads() },
        {
          ...at,
          kind: 'capacitor',
          name: 'core to earth',
          between: [tag, 'earth'],
          farads: farads(),
        },
      ],
    };
  }
  return line;
}
