import type { Fault, FaultMode } from '../../circuit';
import type { CautionCode, Danger, Reason } from '../../diagnosis';
import { hasSentence, sentenceOf } from './sentenceOf';

export const reasonSentence = ({ code, tags, parts, numbers }: Reason): string =>
  sentenceOf(`reason.${code}`, { tags, parts, ...numbers });

/** What can happen, then what to do. */
export const cautionSentences = (
  code: CautionCode,
): { readonly can: string; readonly do: string } => ({
  can: sentenceOf(`caution.${code}.can`),
  do: sentenceOf(`caution.${code}.do`),
});

export const dangerSentence = ({ code, part }: Pick<Danger, 'code' | 'part'>): string =>
  sentenceOf(`danger.${code}`, { part: part ?? '' });

export const modeWord = (mode: FaultMode): string => sentenceOf(`mode.${mode}`);

/** As "lock, landing 5: open". */
export const faultSentence = ({ part, mode }: Fault): string => `${part}: ${modeWord(mode)}`;

/** Why the server or the reducer refused: case rules, sync rules, or a problem of the request. */
export function refusalSentence(
  code: string,
  details: Readonly<Record<string, unknown>> = {},
): string {
  const key = [`case.${code}`, `sync.${code}`, code].find(hasSentence);
  return sentenceOf(key ?? code, details);
}
