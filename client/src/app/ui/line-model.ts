import { CONTROLLER, stringTags, type Circuit, type LiftState } from '@shared/circuit';
import type { Advice, Observation, ReadingObservation } from '@shared/diagnosis';

/** Of the string's volts: at least this is full, at most that is none (common practice). */
export const FULL_SHARE = 0.85;
export const NONE_SHARE = 0.1;

/** Belief from which a section is drawn as suspected, and below which it is drawn as cleared. */
export const WORTH_A_BAR = 0.02;
export const CLEARED = 0.001;

export type LampLevel = 'live' | 'none' | 'between' | 'unread' | 'proven dead';

/** One terminal of the line. */
export interface Lamp {
  readonly tag: string;
  readonly label: string;
  readonly level: LampLevel;
  /** Volts as read, with one digit; empty where not read. */
  readonly value: string;
  /** Read in another lift state than now. */
  readonly stale: boolean;
  /** Where the red probe goes next. */
  readonly next: boolean;
  /** Reached only in the shaft, at a landing, on the car or in the pit. */
  readonly away: boolean;
}

/** Between two lamps. */
export interface LineSection {
  readonly state: 'live' | 'suspected' | 'cleared' | 'unknown';
  /** 0 to 1: the likelier, the wider. */
  readonly share: number;
}

export interface LampLine {
  readonly lamps: readonly Lamp[];
  /** One less than lamps; entry k lies between lamp k and k + 1. */
  readonly sections: readonly LineSection[];
}

/** How a reading stands to the string's volts. */
export function levelOf(volts: number, full: number): 'live' | 'none' | 'between' {
  const share = Math.abs(volts) / full;
  return share >= FULL_SHARE ? 'live' : share <= NONE_SHARE ? 'none' : 'between';
}

const sameState = (a: LiftState, b: LiftState): boolean =>
  Object.keys({ ...a, ...b }).every((name) => a[name] === b[name]);

export interface LineInputs {
  readonly circuit: Circuit;
  readonly observations: readonly Observation[];
  readonly state: LiftState;
  readonly advice?: Advice;
  /** Isolated and proven dead: prove, test, prove again. */
  readonly provenDead?: boolean;
}

/** The line of lamps of the first string, from the supply to the return. */
export function lampLine({
  circuit,
  observations,
  state,
  advice,
  provenDead = false,
}: LineInputs): LampLine {
  const line = circuit.strings[0]!;
  const tags = [...stringTags(circuit, line), line.return];
  const full = advice?.supplyVolts.mean ?? circuit.nominalVolts;
  const readings = observations.filter((seen) => seen.kind === 'reading');
  const nextTags = nextProbes(advice, line.return);
  const lamps = tags.map((tag): Lamp => {
    const terminal = circuit.terminals.find((each) => each.tag === tag);
    const reading = readings.findLast((each) => toReturn(each, tag, line.return));
    const level = provenDead ? 'proven dead' : reading ? levelOf(reading.volts, full) : 'unread';
    return {
      tag,
      label: tag === line.return ? (terminal?.label ?? 'return') : (terminal?.label ?? ''),
      level,
      value: reading && !provenDead ? Math.abs(reading.volts).toFixed(1) : '',
      stale: !provenDead && reading !== undefined && !sameState(reading.state, state),
      next: nextTags.includes(tag),
      away: !(terminal?.places ?? []).some((place) => place === CONTROLLER),
    };
  });
  return { lamps, sections: lamps.slice(1).map((_, k) => sectionAfter(k, lamps, advice)) };
}

function toReturn({ red, black }: ReadingObservation, tag: string, back: string): boolean {
  return (red === tag && black === back) || (black === tag && red === back);
}

function nextProbes(advice: Advice | undefined, back: string): readonly string[] {
  if (advice?.step.kind !== 'suggestion') return [];
  const { red, black } = advice.step.suggestion;
  return [red, black].filter((tag): tag is string => tag !== undefined && tag !== back);
}

function sectionAfter(k: number, lamps: readonly Lamp[], advice?: Advice): LineSection {
  const from = lamps[k]!;
  const to = lamps[k + 1]!;
  const lastLive = lamps.findLastIndex(({ level, stale }) => level === 'live' && !stale);
  if (k < lastLive) return { state: 'live', share: 0 };
  const belief = advice?.sections.find((each) => each.from === from.tag && each.to === to.tag);
  if (!belief) return { state: 'unknown', share: 0 };
  const share = belief.probability;
  if (share >= WORTH_A_BAR) return { state: 'suspected', share };
  return { state: share < CLEARED ? 'cleared' : 'unknown', share };
}
