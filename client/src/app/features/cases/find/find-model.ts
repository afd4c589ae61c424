import type { Circuit, LiftState } from '@shared/circuit';
import type { CaseState } from '@shared/cases';
import type { Advice, CautionCode, Suggestion } from '@shared/diagnosis';

/** The two probes that the card shows: what the engine asks for, or what was chosen on the line. */
export interface Probes {
  readonly red: string;
  readonly black: string;
  readonly place: string;
  readonly state: LiftState;
  /** True: the reading that the engine asked for. */
  readonly asked: boolean;
}

export function suggestionOf(advice: Advice | undefined): Suggestion | undefined {
  if (advice?.step.kind === 'suggestion' || advice?.step.kind === 'contradiction') {
    return advice.step.suggestion;
  }
  return undefined;
}

/**
 * What the card shows. A pair chosen on the line wins over the suggestion; the suggestion's own pair stays
 * what is asked for when its probes are swapped.
 */
export function probesShown(
  advice: Advice | undefined,
  chosen: { readonly red: string; readonly black: string } | undefined,
  here: { readonly place: string; readonly state: LiftState },
): Probes | undefined {
  const suggestion = suggestionOf(advice);
  const asked =
    suggestion?.kind === 'reading' && suggestion.red && suggestion.black
      ? {
          red: suggestion.red,
          black: suggestion.black,
          place: suggestion.place,
          state: suggestion.state,
          asked: true,
        }
      : undefined;
  if (!chosen) return asked;
  if (asked && chosen.red === asked.black && chosen.black === asked.red) {
    return { ...asked, ...chosen };
  }
  return { ...chosen, ...here, asked: false };
}

/** A touch on a lamp: red goes there; on the return, black goes back to it. */
export function chosenProbes(
  circuit: Circuit,
  tag: string,
): { readonly red: string; readonly black: string } {
  const line = circuit.strings[0]!;
  return tag === line.return
    ? { red: line.return, black: line.supplyReturn }
    : { red: tag, black: line.return };
}

/** Cautions that were not acknowledged at this place during this visit. */
export function cautionsDue(
  state: CaseState,
  codes: readonly CautionCode[],
  place: string,
): readonly CautionCode[] {
  return codes.filter(
    (code) => !state.acknowledged.some((known) => known.code === code && known.place === place),
  );
}

/** Values of conditions that the reading needs and that are not so now, as `name: value`. */
export function statesToSet(wanted: LiftState, now: LiftState): readonly string[] {
  return Object.keys(wanted)
    .filter((name) => now[name] !== undefined && wanted[name] !== now[name])
    .map((name) => `${name}: ${wanted[name]}`);
}

/**
 * The reading that raised a danger, which may be repeated once after isolation: its probes, or undefined
 * before isolation, after the repeat, and where no reading raised it.
 */
export function readingToRepeat(
  state: CaseState,
): { readonly red: string; readonly black: string } | undefined {
  if (!state.isolated?.provenDead) return undefined;
  const raised = new Set(state.dangers.flatMap(({ observations }) => observations));
  const at = state.seen.findLastIndex(
    ({ observation }) => observation.kind === 'reading' && raised.has(observation.id),
  );
  const reading = state.seen[at]?.observation;
  if (reading?.kind !== 'reading') return undefined;
  const { red, black } = reading;
  const repeated = state.seen
    .slice(at + 1)
    .some(
      ({ observation }) =>
        observation.kind === 'reading' && observation.red === red && observation.black === black,
    );
  return repeated ? undefined : { red, black };
}
