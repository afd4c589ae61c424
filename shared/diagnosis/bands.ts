/** Of the string's volts: at least this is full, at most that is none (common practice). */
export const FULL = 0.85;
export const NONE = 0.05;

/** How volts stand to those of the whole string. */
export function bandOf(volts: number, full: number): 'full' | 'between' | 'none' {
  const share = Math.abs(volts) / full;
  return share >= FULL ? 'full' : share <= NONE ? 'none' : 'between';
}
