/**
 * A language that nobody speaks: brackets around each text and accents on its letters. What a screen shows
 * without brackets was not marked for translation; what is cut off at the end needs more room.
 */
export const OPEN = '⟦';
export const CLOSE = '⟧';
export const PSEUDO_LOCALE = 'en-XA';

const plain = 'aeiouncyAEIOUNCY';
const accented = 'áéíóúñçýÁÉÍÓÚÑÇÝ';
const accent = (letter: string): string => accented[plain.indexOf(letter)] ?? letter;

/** Depth at which the words of a choice of forms stand: `{n, plural, =1 {here} other {here}}`. */
const FORM = 2;

/** @param text with placeholders in braces; or a choice of forms as a whole */
export function pseudoText(text: string): string {
  const choice = /^\{\w+, *(plural|select)/.test(text);
  const words = choice ? FORM : 0;
  let depth = 0;
  let out = choice ? '' : OPEN;
  for (const letter of text) {
    if (letter === '{') {
      depth += 1;
      out += choice && depth === FORM ? `{${OPEN}` : '{';
    } else if (letter === '}') {
      out += choice && depth === FORM ? `${CLOSE}}` : '}';
      depth -= 1;
    } else {
      out += depth === words ? accent(letter) : letter;
    }
  }
  return choice ? out : out + CLOSE;
}

export const pseudoTable = (texts: Readonly<Record<string, string>>): Record<string, string> =>
  Object.fromEntries(Object.entries(texts).map(([key, text]) => [key, pseudoText(text)]));
