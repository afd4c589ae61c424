import type { Step } from './advice';
import { setUpKey } from './belief';
import type { Consultation } from './consultation';
import type { Suggesting } from './suggesting';

/** *Not described* above this: the readings can't all be true on the circuit as drawn. */
const FITS_NOTHING = 0.3;
/** Left out, the doubtful reading lets the others agree down to this. */
const FITS_WITHOUT = 0.05;

/**
 * Which pair, if mistaken, would make the rest agree; and a different reading that tells. Once the same
 * pair was read twice and still stands against the rest, the circuit is in doubt, not the reading.
 */
export function contradictionOf(
  about: Consultation,
  suggesting: Suggesting,
): Extract<Step, { kind: 'contradiction' }> | undefined {
  if (about.belief.notDescribed < FITS_NOTHING) return undefined;
  const doubtful = about.readings
    .map((reading) => ({ reading, left: about.without(setUpKey(reading)).notDescribed }))
    .sort((a, b) => a.left - b.left)[0];
  if (!doubtful) return undefined;
  const { reading, left } = doubtful;
  const again = about.readings.filter((each) => setUpKey(each) === setUpKey(reading)).length > 1;
  const suggestion = again
    ? suggesting.next()?.suggestion
    : suggesting.repeat(reading.red, reading.black);
  return {
    kind: 'contradiction',
    doubtful: left < FITS_WITHOUT ? [`${reading.red} – ${reading.black}`] : [],
    ...(suggestion ? { suggestion } : {}),
  };
}
