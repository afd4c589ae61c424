import type { DiodeLaw } from './diodeLaw';
import { recover, type Elimination } from './elimination';
import { OPEN_OHMS, SHORTED_DIODE_OHMS } from './faultEffects';
import { USUAL_HERTZ, type StampedBridge, type StampedNetwork } from './stamping';
import { EARTH_NODE } from './topology';

/** A conductance across a combination of nodes: current = siemens · (weights · volts + direct + sine·sin). */
export interface Combination {
  readonly weights: Float64Array;
  readonly siemens: number;
  /** Volts in series that do not depend on these nodes. */
  readonly direct: number;
  readonly sine: number;
}

/** A capacitor between two kept nodes; -1 is earth. */
export interface KeptCapacitor {
  readonly a: number;
  readonly b: number;
  readonly farads: number;
}

/** The nodes of bridges, transformers and capacitors with all that the rest of the circuit does to them. */
export interface KeptNodes {
  readonly size: number;
  /** Siemens, upper triangle. */
  readonly between: Float64Array;
  readonly leak: Float64Array;
  /** Amperes into each node: constant, and times the sine of the supply. */
  readonly direct: Float64Array;
  readonly sine: Float64Array;
  /** Anode and cathode; -1 is earth. */
  readonly diodes: readonly (readonly [number, number])[];
  readonly windings: readonly Combination[];
  readonly capacitors: readonly KeptCapacitor[];
  /** Of the alternating supply; where there is none, any will do: nothing varies. */
  readonly periodSeconds: number;
  readonly law: DiodeLaw;
}

/** The kept nodes as the eliminated rest of the circuit leaves them. */
export function keptNodes(
  network: StampedNetwork,
  elimination: Elimination,
  direct: Float64Array,
  sine: Float64Array,
  law: DiodeLaw,
): KeptNodes {
  const { topology } = network;
  const size = topology.kept;
  const first = topology.size - size;
  const leak = elimination.leak.slice(first);
  const between = new Float64Array(size * size);
  for (let a = 0; a < size; a++) {
    for (let b = a + 1; b < size; b++) {
      between[a * size + b] = elimination.between[topology.edge(first + a, first + b)]!;
    }
  }
  const local = (node: number) => (node === EARTH_NODE ? -1 : node - first);
  const join = (a: number, b: number, siemens: number) => {
    if (a === b) return;
    if (a < 0) leak[b]! += siemens;
    else if (b < 0) leak[a]! += siemens;
    else between[Math.min(a, b) * size + Math.max(a, b)]! += siemens;
  };
  const diodes: (readonly [number, number])[] = [];
  for (const bridge of network.bridges) {
    diodesOf(bridge).forEach(([anode, cathode], index) => {
      const state = bridge.diodes.get(index + 1);
      if (state === undefined) diodes.push([local(anode), local(cathode)]);
      else
        join(local(anode), local(cathode), 1 / (state === 'open' ? OPEN_OHMS : SHORTED_DIODE_OHMS));
    });
  }
  const windings = network.transformers.map(({ primary, secondary, ratio, siemens }) => {
    const weights = new Float64Array(size);
    const put = (node: number, weight: number) => {
      if (node !== EARTH_NODE) weights[node - first]! += weight;
    };
    put(secondary[0], 1);
    put(secondary[1], -1);
    put(primary[0], -ratio);
    put(primary[1], ratio);
    return { weights, siemens, direct: 0, sine: 0 };
  });
  const capacitors = network.capacitors
    .filter(({ a, b }) => a !== b)
    .map(({ a, b, farads }) => ({ a: local(a), b: local(b), farads }));
  const periodSeconds = 1 / (network.sources.find(({ hertz }) => hertz > 0)?.hertz ?? USUAL_HERTZ);
  return { size, between, leak, direct, sine, diodes, windings, capacitors, periodSeconds, law };
}

/** Anode and cathode of diodes 1 to 4 of a bridge. */
function diodesOf({ nodes: [a1, a2, plus, minus] }: StampedBridge): readonly [number, number][] {
  return [
    [a1, plus],
    [a2, plus],
    [minus, a1],
    [minus, a2],
  ];
}

/** By node: the weight of each kept node's voltage, of the constant and of the sine in its own. */
export function combinationRows(
  elimination: Elimination,
  direct: Float64Array,
  sine: Float64Array,
): Float64Array {
  const { size, kept } = elimination.topology;
  const first = size - kept;
  const width = kept + 2;
  const rows = new Float64Array(size * width);
  const values = new Float64Array(size);
  for (let k = 0; k < width; k++) {
    values.fill(0);
    if (k < kept) values[first + k] = 1;
    else values.set((k === kept ? direct : sine).subarray(0, first));
    recover(elimination, values);
    for (let node = 0; node < size; node++) rows[node * width + k] = values[node]!;
  }
  return rows;
}
