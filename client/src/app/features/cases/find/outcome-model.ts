import type { Outcome } from '@shared/diagnosis';

/** Outcomes that the meter shows alike, as one row. */
export interface OutcomeRow {
  readonly band: Outcome['band'];
  /** 0 to 1. */
  readonly probability: number;
  /** Parts that stay suspected, likeliest first. */
  readonly leaves: readonly string[];
  readonly stretch?: readonly [string, string];
  readonly fromVolts?: number;
  readonly toVolts?: number;
}

/** Less than this is not worth a row beside the others. */
export const WORTH_A_ROW = 0.005;
const ORDER: readonly Outcome['band'][] = ['full', 'none', 'between', 'in', 'out'];

/** One row for each band, full volts first; what is hardly likely is left out where something is. */
export function outcomeRows(outcomes: readonly Outcome[]): readonly OutcomeRow[] {
  const rows = ORDER.flatMap((band) => {
    const alike = outcomes
      .filter((outcome) => outcome.band === band)
      .sort((a, b) => b.probability - a.probability);
    return alike.length === 0 ? [] : [merged(band, alike)];
  });
  const likely = rows.filter(({ probability }) => probability >= WORTH_A_ROW);
  return likely.length > 0 ? likely : rows;
}

function merged(band: Outcome['band'], alike: readonly Outcome[]): OutcomeRow {
  const volts = alike.flatMap(({ fromVolts, toVolts }) => [fromVolts, toVolts]).filter(isNumber);
  return {
    band,
    probability: alike.reduce((sum, { probability }) => sum + probability, 0),
    leaves: [...new Set(alike.flatMap(({ leaves }) => leaves))],
    ...(alike.length === 1 && alike[0]!.stretch ? { stretch: alike[0]!.stretch } : {}),
    ...(volts.length > 0 ? { fromVolts: Math.min(...volts), toVolts: Math.max(...volts) } : {}),
  };
}

const isNumber = (value: number | undefined): value is number => value !== undefined;
