import type { Circuit, PartOf, RelayPosition } from '../circuit/circuit';
import type { FaultEffects } from './faultEffects';

export type Coil = PartOf<'coil'>;
export type Positions = Readonly<Record<string, 'in' | 'out'>>;
/** Amperes through each coil, by name: mean of the magnitude on DC, RMS on AC. */
export type CoilAmps = Readonly<Record<string, number>>;

/** Sets of positions that are looked at before a circuit is said to chatter. */
const MAX_SETS = 64;

export interface Settled {
  readonly relays: Readonly<Record<string, RelayPosition>>;
  /** Positions that the readings belong to; where relays chatter, those at which the search ended. */
  readonly positions: Positions;
}

export function coilsOf(circuit: Circuit): readonly Coil[] {
  return circuit.parts.filter((part): part is Coil => part.kind === 'coil');
}

/** The relays all out, but for armatures that are stuck in. */
export function allOut(coils: readonly Coil[], effects: FaultEffects): Positions {
  return Object.fromEntries(coils.map(({ name }) => [name, effects.stuck.get(name) ?? 'out']));
}

/** Where a coil's current takes its armature from here; milliamperes times effective turns decide. */
function wanted(coil: Coil, now: 'in' | 'out', amps: number, effects: FaultEffects): 'in' | 'out' {
  const stuck = effects.stuck.get(coil.name);
  if (stuck) return stuck;
  const pull = amps * 1000 * (effects.turns.get(coil.name) ?? 1);
  if (now === 'out') return pull >= coil.pullInMilliamps ? 'in' : 'out';
  return pull < coil.dropOutMilliamps ? 'out' : 'in';
}

/**
 * Lets the relays move one event after the other, the shortest delay first, until none wants to move.
 * If that order never ends, the others are tried; only if none settles is it chatter.
 */
export function settle(
  coils: readonly Coil[],
  start: Positions,
  effects: FaultEffects,
  ampsAt: (positions: Positions) => CoilAmps,
): Settled {
  const key = (positions: Positions) => coils.map(({ name }) => positions[name]).join();
  const moving = (positions: Positions): readonly Coil[] => {
    const amps = ampsAt(positions);
    return coils.filter((coil) => {
      const now = positions[coil.name]!;
      return wanted(coil, now, amps[coil.name] ?? 0, effects) !== now;
    });
  };
  const moved = (positions: Positions, { name }: Coil): Positions => ({
    ...positions,
    [name]: positions[name] === 'in' ? 'out' : 'in',
  });

  const inTime = settleInTime(start, moving, moved, key);
  if (inTime) return { relays: inTime, positions: inTime };

  const seen = new Set([key(start)]);
  const visited: Positions[] = [start];
  for (let next = 0; next < visited.length && visited.length <= MAX_SETS; next++) {
    const positions = visited[next]!;
    const movers = moving(positions);
    if (movers.length === 0) return { relays: positions, positions };
    for (const coil of movers) {
      const after = moved(positions, coil);
      if (seen.has(key(after))) continue;
      seen.add(key(after));
      visited.push(after);
    }
  }
  const chattering = coils.filter(
    ({ name }) => new Set(visited.map((positions) => positions[name])).size > 1,
  );
  const relays: Record<string, RelayPosition> = { ...start };
  for (const { name } of chattering) relays[name] = 'chatter';
  return { relays, positions: start };
}

/** The order that the delays give; undefined where it comes back to where it was. */
function settleInTime(
  start: Positions,
  moving: (positions: Positions) => readonly Coil[],
  moved: (positions: Positions, coil: Coil) => Positions,
  key: (positions: Positions) => string,
): Positions | undefined {
  let positions = start;
  let now = 0;
  let due = new Map<Coil, number>();
  const seen = new Set<string>();
  for (let events = 0; events <= MAX_SETS; events++) {
    const movers = moving(positions);
    if (movers.length === 0) return positions;
    // A relay that went on wanting to move keeps its time; one whose current came back starts afresh.
    due = new Map(movers.map((coil) => [coil, due.get(coil) ?? now + coil.delaySeconds]));
    const first = movers.reduce((a, b) => (due.get(b)! < due.get(a)! ? b : a));
    const situation = `${key(positions)} ${movers.map((c) => (due.get(c)! - now).toFixed(6)).join()}`;
    if (seen.has(situation)) return undefined;
    seen.add(situation);
    now = due.get(first)!;
    due.delete(first);
    positions = moved(positions, first);
  }
  return undefined;
}
