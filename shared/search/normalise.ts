/** What decomposition leaves behind: accents and other marks on letters. */
const MARKS = /\p{M}+/gu;
const SEPARATORS = /[^\p{L}\p{N}]+/u;
/** Letters that decomposition keeps whole, as they are typed without them. */
const SPELT: Readonly<Record<string, string>> = { ß: 'ss', æ: 'ae', ø: 'o', œ: 'oe', ł: 'l' };

/** Lower case, without accents: what two people type for one name becomes the same text. */
export function normalise(text: string): string {
  return text
    .normalize('NFKD')
    .replace(MARKS, '')
    .toLowerCase()
    .replace(/[ßæøœł]/g, (letter) => SPELT[letter]!);
}

/** The words and numbers of a text, normalised, in order. */
export const termsOf = (text: string): readonly string[] =>
  normalise(text)
    .split(SEPARATORS)
    .filter((term) => term.length > 0);

/** Letters that the labels leave out, as the digits that they are mistaken for (Crockford's base 32). */
const MISREAD: Readonly<Record<string, string>> = { I: '1', L: '1', O: '0' };

/** A label as it is stored, from how it was typed: spaces and hyphens out, I and L as 1, O as 0. */
export const asLabel = (typed: string): string =>
  typed
    .normalize('NFKC')
    .toUpperCase()
    .replace(/[\s-]+/g, '')
    .replace(/[ILO]/g, (letter) => MISREAD[letter]!);
