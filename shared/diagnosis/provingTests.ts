import {
  isResting,
  restingState,
  stringTags,
  type Circuit,
  type Fault,
  type LiftState,
  type Part,
} from '../circuit';
import { solve, type Solution } from '../solver';
import type { CautionCode } from './advice';
import { FULL } from './bands';
import { cautionsOf } from './cautions';
import { meterFunctions } from './meterFunctions';
import { USUAL_METER } from './observation';

/** What to do, and what must be seen, before a touched device counts as proven. */
export interface ProvingTest {
  /** As it was given. */
  readonly device: string;
  /**
   * `opens`: operate it, and the string behind it must go dead. `drops`: open the string before the
   * relay, and the relay must drop. `carries`: it has nothing to operate; the string behind it is live.
   */
  readonly kind: 'opens' | 'drops' | 'carries';
  readonly parts: readonly string[];
  readonly place: string;
  /** The lift state to set first, in which the string is live behind the device. */
  readonly state: LiftState;
  /** The condition that opens it, where it is not worked by hand. */
  readonly condition?: { readonly name: string; readonly value: string };
  /** Where to read, from the tag to the return; absent where the string does not run through it. */
  readonly red?: string;
  readonly black: string;
  /** Relays that are in before, and must be out after. Empty where none hangs behind it. */
  readonly relays: readonly string[];
  /** Neither a tag nor a relay shows it (another way runs past it): the drawing is to be looked at. */
  readonly shows: boolean;
  readonly cautions: readonly CautionCode[];
}

/** A tag that shows less than this of the string's volts with the device open has gone (judgement). */
const GONE = 0.5;

/** A test for each device or part that was touched; names that the circuit does not have are left out. */
export function provingTests(circuit: Circuit, devices: readonly string[]): readonly ProvingTest[] {
  const state = liveState(circuit);
  const whole = solve(circuit, state, []);
  return [...new Set(devices)].flatMap((device) => {
    const parts = circuit.parts.filter((part) => part.device === device || part.name === device);
    return parts.length === 0 ? [] : [testOf(circuit, device, parts, state, whole)];
  });
}

function testOf(
  circuit: Circuit,
  device: string,
  parts: readonly Part[],
  state: LiftState,
  whole: Solution,
): ProvingTest {
  const kind = parts.some((part) => part.kind === 'contact')
    ? 'opens'
    : parts.every((part) => part.kind === 'coil')
      ? 'drops'
      : 'carries';
  const opened = solve(circuit, state, parts.map(opening));
  const line = circuit.strings[0]!;
  const tags = stringTags(circuit, line).filter((tag) => reachedByProbe(circuit, tag));
  const red =
    kind === 'drops'
      ? undefined
      : tags.find((tag) => live(circuit, whole, tag, FULL) && !live(circuit, opened, tag, GONE));
  const ofCoils = parts.flatMap((part) => (part.kind === 'coil' ? part.name : []));
  const dropped = Object.keys(whole.relays).filter(
    (relay) => whole.relays[relay] === 'in' && opened.relays[relay] !== 'in',
  );
  const relays = kind === 'drops' ? ofCoils : dropped;
  const condition = conditionOf(circuit, parts, state);
  const { place } = parts[0]!;
  return {
    device,
    kind,
    parts: parts.map(({ name }) => name),
    place,
    state,
    ...(condition ? { condition } : {}),
    ...(red === undefined ? {} : { red }),
    black: line.return,
    relays,
    shows: red !== undefined || relays.length > 0,
    cautions: cautionsOf(
      circuit,
      { place, red: red ?? line.from, black: line.return },
      { changesState: kind !== 'carries' || !isResting(circuit, state), returnDoubtful: false },
    ),
  };
}

function opening({ name, kind }: Part): Fault {
  return { part: name, mode: kind === 'fuse' ? 'blown' : kind === 'supply' ? 'dead' : 'open' };
}

/** The state, at rest or one condition away from it, in which most relays are in: the string is whole. */
function liveState(circuit: Circuit): LiftState {
  const resting = restingState(circuit);
  const states = [
    resting,
    ...circuit.conditions.flatMap(({ name, values }) =>
      values.slice(1).map((value) => ({ ...resting, [name]: value })),
    ),
  ];
  const tags = stringTags(circuit, circuit.strings[0]!);
  const liveness = (state: LiftState) => {
    const whole = solve(circuit, state, []);
    const relays = Object.values(whole.relays).filter((position) => position === 'in').length;
    return relays + tags.filter((tag) => live(circuit, whole, tag, FULL)).length;
  };
  return states
    .map((state) => ({ state, live: liveness(state) }))
    .reduce((best, each) => (each.live > best.live ? each : best)).state;
}

function conditionOf(
  circuit: Circuit,
  parts: readonly Part[],
  state: LiftState,
): ProvingTest['condition'] {
  for (const part of parts) {
    const moved = part.kind === 'contact' ? part.condition : undefined;
    const value = circuit.conditions
      .find(({ name }) => name === moved?.name)
      ?.values.find((each) => !moved!.closedWhen.includes(each));
    if (moved && value !== undefined && state[moved.name] !== value) {
      return { name: moved.name, value };
    }
  }
  return undefined;
}

function reachedByProbe(circuit: Circuit, tag: string): boolean {
  return circuit.terminals.some(
    (each) => each.tag === tag && each.reachable && each.places.length > 0,
  );
}

function live(circuit: Circuit, solution: Solution, red: string, share: number): boolean {
  const black = circuit.strings[0]!.return;
  const { mean, ripple } = solution.read({ red, black, meterOhms: USUAL_METER.ohms });
  const volts = meterFunctions(circuit)(red, black) === 'dc volts' ? mean : ripple;
  return Math.abs(volts) >= share * circuit.nominalVolts;
}
