import { MOST_VOLTS } from '@shared/cases';

/** What was typed, as volts or as a problem with a code. */
export type PadValue =
  | { readonly kind: 'empty' }
  | { readonly kind: 'volts'; readonly volts: number; readonly swapped: boolean }
  | { readonly kind: 'problem'; readonly problem: 'not a number' | 'too large' };

const numberPattern = /^[-+]?(\d+([.,]\d*)?|[.,]\d+)(e[-+]?\d+)?$/i;

/**
 * Reads what a person typed or pasted: a comma or a point before the decimals, a unit behind, blanks.
 * @param direct on a DC range a negative value means swapped probes: taken, and said
 */
export function padValue(text: string, direct: boolean): PadValue {
  const bare = text
    .trim()
    .replace(/\s+/g, '')
    .replace(/[−–]/g, '-')
    .replace(/(volts?|v)(dc|ac)?$/i, '');
  if (bare === '' || bare === '-') return { kind: 'empty' };
  if (!numberPattern.test(bare)) return { kind: 'problem', problem: 'not a number' };
  const volts = Number(bare.replace(',', '.'));
  if (!Number.isFinite(volts) || Math.abs(volts) > MOST_VOLTS) {
    return { kind: 'problem', problem: 'too large' };
  }
  return { kind: 'volts', volts: direct ? volts : Math.abs(volts), swapped: direct && volts < 0 };
}

/** Most characters that the display takes from keys. */
const MOST_KEYS = 8;

/** The text after one more key of the pad. */
export function afterKey(text: string, key: string): string {
  if (key === '±') return text.startsWith('-') ? text.slice(1) : `-${text}`;
  if (key === '⌫') return text.slice(0, -1);
  if (key === '.' && /[.,]/.test(text)) return text;
  return text.length >= MOST_KEYS ? text : text + key;
}
