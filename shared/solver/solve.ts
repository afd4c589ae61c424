import type { Circuit, Fault, LiftState, RelayPosition } from '../circuit/circuit';
import { completeState, isResting } from '../circuit/liftState';
import type { DiodeLaw } from './diodeLaw';
import { effectsOf, type FaultEffects } from './faultEffects';
import { PhasorNetwork } from './phasorNetwork';
import { RectifiedNetwork } from './rectifiedNetwork';
import { allOut, coilsOf, settle, type Coil, type CoilAmps, type Positions } from './relays';
import type { NodePair, SettledNetwork } from './settledNetwork';
import type { Probes, SettledReading, Solution } from './solution';
import { stamp } from './stamping';
import { EARTH } from '../circuit/circuit';
import { EARTH_NODE, topologyOf, type Topology } from './topology';

export interface SolveOptions {
  /** Relays before the state was set. Default: as they settle at rest with the same faults. */
  readonly previous?: Readonly<Record<string, RelayPosition>>;
  /** Default: `POWER_RECTIFIER`. */
  readonly diodeLaw?: DiodeLaw;
  /** Samples of a cycle to begin with, a power of two from 32 up. Default 256. */
  readonly points?: number;
}

/**
 * The reference solver: what settles in one lift state with these faults.
 *
 * Circuits without a bridge are solved by phasors, each frequency by itself, capacitors included.
 * Circuits with a bridge are reduced to its nodes and sampled over a cycle, which capacitors make one
 * that ends as it begins; one frequency is taken for all supplies there (`solvable` says so beforehand).
 * Volts are RMS or mean as {@link SettledReading} says; phases of all supplies are equal.
 */
export function solve(
  circuit: Circuit,
  state: LiftState,
  faults: readonly Fault[],
  options: SolveOptions = {},
): Solution {
  const topology = topologyOf(circuit);
  const effects = effectsOf(faults);
  const coils = coilsOf(circuit);
  const networks = new NetworksByContacts(circuit, topology, state, effects, options);
  const settled = settle(
    coils,
    startOf(circuit, state, faults, options, coils, effects),
    effects,
    (p) => networks.amps(p, coils),
  );
  const network = networks.at(settled.positions);
  const amps = networks.amps(settled.positions, coils);
  return {
    relays: settled.relays,
    coilMilliamps: Object.fromEntries(coils.map(({ name }) => [name, amps[name]! * 1000])),
    read: (probes) => read(network, topology, probes),
  };
}

function startOf(
  circuit: Circuit,
  state: LiftState,
  faults: readonly Fault[],
  options: SolveOptions,
  coils: readonly Coil[],
  effects: FaultEffects,
): Positions {
  if (!options.previous && isResting(circuit, state)) return allOut(coils, effects);
  const before = options.previous ?? solve(circuit, {}, faults, options).relays;
  return Object.fromEntries(
    coils.map(({ name }) => [
      name,
      effects.stuck.get(name) ?? (before[name] === 'in' ? 'in' : 'out'),
    ]),
  );
}

function read(network: SettledNetwork, topology: Topology, probes: Probes): SettledReading {
  const pair = { red: nodeOf(topology, probes.red), black: nodeOf(topology, probes.black) };
  return network.read(pair, probes.meterOhms);
}

function nodeOf(topology: Topology, tag: string): number {
  if (tag === EARTH) return EARTH_NODE;
  const node = topology.nodes.get(tag);
  if (node === undefined) throw new RangeError(`no terminal ${tag}`);
  return node;
}

/** Relays that move no contact leave the circuit as it is: it is solved once for each set of contacts. */
class NetworksByContacts {
  private readonly networks = new Map<string, SettledNetwork>();
  private readonly acting: readonly string[];
  private readonly state: LiftState;

  constructor(
    private readonly circuit: Circuit,
    private readonly topology: Topology,
    state: LiftState,
    private readonly effects: FaultEffects,
    private readonly options: SolveOptions,
  ) {
    this.state = completeState(circuit, state);
    const named = circuit.parts.flatMap((p) =>
      p.kind === 'contact' && p.relay ? [p.relay.name] : [],
    );
    this.acting = [...new Set(named)];
  }

  at(positions: Positions): SettledNetwork {
    const key = this.acting.map((name) => positions[name]).join();
    let network = this.networks.get(key);
    if (!network) {
      const { state, effects, options } = this;
      const stamped = stamp(this.circuit, this.topology, { state, relays: positions, effects });
      network =
        stamped.bridges.length > 0
          ? new RectifiedNetwork(stamped, options.diodeLaw, options.points)
          : new PhasorNetwork(stamped);
      this.networks.set(key, network);
    }
    return network;
  }

  amps(positions: Positions, coils: readonly Coil[]): CoilAmps {
    const network = this.at(positions);
    return Object.fromEntries(
      coils.map((coil) => {
        const pair: NodePair = {
          red: nodeOf(this.topology, coil.between[0]),
          black: nodeOf(this.topology, coil.between[1]),
        };
        const ohms = this.effects.ohms.get(coil.name) ?? coil.ohms;
        const { meanMagnitude, rms } = network.current(pair, ohms);
        return [coil.name, coil.current === 'direct' ? meanMagnitude : rms];
      }),
    );
  }
}
