import type { Circuit, LiftState, PartOf, RelayPosition } from './circuit';

/** The state in which every condition has its first value: the lift at rest. */
export function restingState(circuit: Circuit): LiftState {
  return Object.fromEntries(circuit.conditions.map(({ name, values }) => [name, values[0]!]));
}

/** A state with the value at rest for every condition that it does not mention. */
export function completeState(circuit: Circuit, state: LiftState): LiftState {
  return { ...restingState(circuit), ...state };
}

/** The same text for the same state, whatever the order in which its conditions were set. */
export function liftStateKey(circuit: Circuit, state: LiftState): string {
  const full = completeState(circuit, state);
  return circuit.conditions.map(({ name }) => `${name}=${full[name] ?? ''}`).join(';');
}

export function isResting(circuit: Circuit, state: LiftState): boolean {
  return liftStateKey(circuit, state) === liftStateKey(circuit, {});
}

/**
 * Whether a contact of a lift without faults is closed. `state` holds every condition that the contact
 * names; a relay that chatters is counted as out, since nothing can rely on its contacts.
 */
export function contactClosed(
  part: PartOf<'contact'>,
  state: LiftState,
  relays: Readonly<Record<string, RelayPosition>>,
): boolean {
  const { condition, relay } = part;
  if (condition && !condition.closedWhen.includes(state[condition.name] ?? '')) return false;
  if (relay) return (relays[relay.name] === 'in') === (relay.closedWhen === 'in');
  return true;
}
