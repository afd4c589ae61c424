import { caseSentences } from './cases';
import { circuitSentences } from './circuit';
import { engineSentences } from './engine';
import { httpSentences } from './http';

/**
 * The English sentence of every code. `{name}` is filled from the details; what stands in square
 * brackets is left out where a detail in it is missing.
 */
export const sentences: Readonly<Record<string, string>> = {
  ...circuitSentences,
  ...caseSentences,
  ...httpSentences,
  ...engineSentences,
};

let table: Readonly<Record<string, string>> = sentences;

/** Takes another language's table; what it lacks stays English. Called before the first screen. */
export function useSentences(locale: Readonly<Record<string, string>>): void {
  table = { ...sentences, ...locale };
}

/** Most digits behind the point where a number stands in a sentence. */
const DIGITS = 1;
/** Digits of a number under 1, which would else be shown as none. */
const SMALL_DIGITS = 2;

function worded(value: unknown): string {
  if (Array.isArray(value)) return value.map(worded).join(', ');
  if (typeof value === 'number') {
    const small = Math.abs(value) < 1;
    return String(Number(small ? value.toPrecision(SMALL_DIGITS) : value.toFixed(DIGITS)));
  }
  return typeof value === 'string' ? value : '';
}

const DETAIL = /\{(\w+)\}/g;

const filled = (part: string, details: Readonly<Record<string, unknown>>): boolean =>
  [...part.matchAll(DETAIL)].every(([, name]) => worded(details[name!]) !== '');

/** The sentence of a code; one that is missing from the table shows the code and never throws. */
export function sentenceOf(code: string, details: Readonly<Record<string, unknown>> = {}): string {
  const sentence = Object.hasOwn(table, code) ? table[code]! : code;
  return sentence
    .replace(/\[([^[\]]*)\]/g, (_, part: string) => (filled(part, details) ? part : ''))
    .replace(DETAIL, (_, name: string) => worded(details[name]));
}

export const hasSentence = (code: string): boolean => Object.hasOwn(table, code);
