import { writeFileSync } from 'node:fs';
import { playedEvents } from './cases/playAll';
import { PLAYED_FILE } from './cases/playedLog';
import { companies } from './companies';

/**
 * Plays the demo's past cases by engine and solver, and writes them down:
 * `npx tsx seeds/play.ts`, after cases, circuits or events have changed. Advice shown stays what it was
 * when it was played; a newer engine need not agree with it.
 */

/** Digits kept of a number: more than any meter shows, fewer than a belief is computed to. */
const DIGITS = 4;

const short = (_: string, value: unknown): unknown =>
  typeof value === 'number' && !Number.isInteger(value) ? Number(value.toPrecision(DIGITS)) : value;

const lines = companies.flatMap((company) =>
  playedEvents(company).map((played) => JSON.stringify({ company: company.key, ...played }, short)),
);
writeFileSync(PLAYED_FILE, `${lines.join('\n')}\n`);
