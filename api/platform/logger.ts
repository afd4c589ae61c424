import pino, { type DestinationStream, type Logger } from 'pino';
import type { Config } from '../config';

/**
 * An error as the log may hold it: kind, code and where it happened. Of a failed query the statement, but
 * never its values, and nothing of PostgreSQL's `detail`, which repeats them.
 */
export function safeError(thrown: unknown): Record<string, unknown> {
  if (!(thrown instanceof Error)) return { type: typeof thrown };
  const { query, cause, code } = thrown as { query?: unknown; cause?: unknown; code?: unknown };
  const places = (thrown.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line));
  const isQuery = typeof query === 'string';
  return {
    type: thrown.name,
    message: isQuery ? `query failed: ${query}` : thrown.message,
    ...(code === undefined ? {} : { code }),
    ...(cause instanceof Error ? { cause: safeCause(cause) } : {}),
    stack: places.join('\n'),
  };
}

const safeCause = (cause: Error & { code?: unknown }) => ({
  type: cause.name,
  // The words of PostgreSQL may quote a value that could not be read.
  ...(cause.code === undefined ? { message: cause.message } : { code: cause.code }),
});

/** Structured lines on standard output, or where `destination` says. */
export const createLogger = (
  level: Config['logLevel'],
  destination: DestinationStream = pino.destination(1),
): Logger => pino({ level, serializers: { err: safeError } }, destination);
