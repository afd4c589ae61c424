import type { Outcome } from './advice';
import { bandOf } from './bands';
import type { Consultation, Group } from './consultation';

/** Parts named for an outcome. */
const MOST_LEFT = 6;
/** An outcome less likely than this is not worth a line on the screen. */
const WORTH_A_LINE = 0.004;
/** Volts are told to this step. */
const STEP = 0.1;

const order: Readonly<Record<Outcome['band'], number>> = {
  full: 0,
  in: 0,
  between: 1,
  none: 2,
  out: 2,
};

/** What each band of a reading would mean: full, between, none; one line each. */
export function outcomesOf(consultation: Consultation, groups: readonly Group[]): Outcome[] {
  const full = consultation.circuit.nominalVolts * consultation.belief.supply.mean;
  const bands = new Map<Outcome['band'], Group[]>();
  for (const group of groups) {
    const band = bandOf((group.from + group.to) / 2, full);
    bands.set(band, [...(bands.get(band) ?? []), group]);
  }
  return [...bands]
    .map(([band, inside]) => outcome(consultation, band, inside))
    .filter(({ probability }) => probability >= WORTH_A_LINE)
    .sort((a, b) => order[a.band] - order[b.band]);
}

function outcome(
  consultation: Consultation,
  band: Outcome['band'],
  groups: readonly Group[],
): Outcome {
  const members = groups.flatMap((group) => group.members);
  const volts = groups.flatMap(({ from, to }) => [Math.abs(from), Math.abs(to)]);
  const stretch = consultation.plan.stretchOf(members);
  return {
    band,
    fromVolts: rounded(Math.min(...volts)),
    toVolts: rounded(Math.max(...volts)),
    probability: groups.reduce((sum, { share }) => sum + share, 0),
    leaves: consultation.partsOf(members).slice(0, MOST_LEFT),
    ...(stretch ? { stretch: [stretch[0], stretch[1]] } : {}),
  };
}

const rounded = (volts: number): number => Math.round(volts / STEP) * STEP;
