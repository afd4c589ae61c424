import { readFileSync } from 'node:fs';
import * as z from 'zod';
import { caseEventSchema } from '../../shared/cases';
import type { PlayedEvent } from './playCase';

/** One played event a line, written by `seeds/play.ts`. */
export const PLAYED_FILE = new URL('./played.ndjson', import.meta.url);

const lineSchema = z.object({ company: z.string(), event: caseEventSchema, actor: z.uuid() });

/**
 * The past cases of a company as they were played, in the order in which they happened. Playing them
 * takes the engine seconds; reading them takes milliseconds.
 * @throws ZodError when a line is no event
 */
export function playedLog(company: string): readonly PlayedEvent[] {
  return readFileSync(PLAYED_FILE, 'utf8')
    .trim()
    .split('\n')
    .map((line) => lineSchema.parse(JSON.parse(line)))
    .filter((played) => played.company === company)
    .map(({ event, actor }) => ({ event, actor }));
}
