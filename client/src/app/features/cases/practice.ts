import type { CaseState } from '@shared/cases';
import { tagsOf, type Circuit, type Fault } from '@shared/circuit';

/** The device that a part belongs to, as a repair names it. */
export function deviceOf(circuit: Circuit, part: string): string {
  return circuit.parts.find(({ name }) => name === part)?.device ?? part;
}

/** A practice lift's faults that are still there: a repair of the right device takes its fault away. */
export function faultsLeft(
  circuit: Circuit,
  hidden: readonly Fault[],
  state: CaseState,
): readonly Fault[] {
  const repaired = new Set(state.repairs.flatMap(({ devices }) => devices));
  return hidden.filter(({ part }) => !repaired.has(deviceOf(circuit, part)));
}

const contactsOf = (circuit: Circuit, device: string) =>
  circuit.parts.filter(
    (part) => part.kind === 'contact' && deviceOf(circuit, part.name) === device,
  );

/** The faults of a practice lift while a device is held open; a contact that can't open stays shut. */
export function operated(
  circuit: Circuit,
  faults: readonly Fault[],
  device: string,
): readonly Fault[] {
  const open = contactsOf(circuit, device)
    .filter(({ name }) => !faults.some((fault) => fault.part === name))
    .map(({ name }): Fault => ({ part: name, mode: 'open' }));
  return [...faults, ...open];
}

/** Where it shows that a device opens the string: behind each of its contacts, to the return. */
export function operatedPoints(
  circuit: Circuit,
  device: string,
): readonly { readonly red: string; readonly black: string }[] {
  const line = circuit.strings[0]!;
  return contactsOf(circuit, device)
    .flatMap(tagsOf)
    .filter((tag) => tag !== line.return)
    .map((red) => ({ red, black: line.return }));
}
