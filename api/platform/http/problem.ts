import type { ErrorRequestHandler, RequestHandler } from 'express';
import { STATUS_CODES } from 'node:http';
import type { Logger } from 'pino';
import { ZodError } from 'zod';
import { hasSentence, sentenceOf, type Problem } from '@shared/contract';
import { requestId } from '../db/doors';
import { Refusal, type RefusalCode } from '../refusal';

const statuses: Readonly<Record<string, number>> = {
  not_found: 404,
  not_signed_in: 401,
  wrong_credentials: 401,
  not_allowed: 403,
  cross_site: 403,
  too_many_attempts: 429,
  busy: 503,
  unavailable: 503,
  invalid_request: 400,
  malformed_json: 400,
  unsupported_media_type: 415,
  body_too_large: 413,
  version_missing: 428,
  version_conflict: 412,
  key_missing: 400,
  key_reused: 422,
  internal: 500,
};
/** A feature's own refusal: understood, but not possible as things stand. */
const STATUS_OF_FEATURES = 422;
/** What a client is told to wait when the database or a worker is away, seconds. */
const WAIT_WHEN_UNAVAILABLE = 2;

/** Errors of Express' body reader by their `type`. */
const ofBodyReader: Readonly<Record<string, RefusalCode>> = {
  'entity.parse.failed': 'malformed_json',
  'entity.too.large': 'body_too_large',
  'encoding.unsupported': 'unsupported_media_type',
  'charset.unsupported': 'unsupported_media_type',
  'entity.verify.failed': 'invalid_request',
  'request.aborted': 'invalid_request',
  'request.size.invalid': 'invalid_request',
};

/** PostgreSQL away, starting, stopping or full; the pool's own waits. */
const awayCodes = new Set([
  '57P01',
  '57P02',
  '57P03',
  '53300',
  'ECONNREFUSED',
  'ECONNRESET',
  '57014',
]);

/** A value that a route did not take: code, and the fields where one is known. */
export class InvalidRequest extends Refusal {
  constructor(readonly fields: NonNullable<Problem['fields']>) {
    super('invalid_request');
  }
}

/** The findings of zod, one per field, each with its sentence. */
export function fieldsOf(error: ZodError): NonNullable<Problem['fields']> {
  return error.issues.map((issue) => {
    const named = `field.${issue.code}`;
    const code = hasSentence(named) ? named : 'field.custom';
    const { code: _code, message: _message, path, ...details } = issue;
    return {
      field: path.map(String).join('.'),
      code,
      detail: sentenceOf(code, { ...details, path: path.map(String).join('.') }),
    };
  });
}

/** Makes a refusal of any thrown value; undefined where it is a fault of ours. */
function refusalOf(thrown: unknown): Refusal | undefined {
  if (thrown instanceof Refusal) return thrown;
  if (thrown instanceof URIError) return new Refusal('invalid_request');
  if (typeof thrown !== 'object' || thrown === null) return undefined;
  const { type, cause, code, message, status } = thrown as Record<string, unknown>;
  if (typeof type === 'string' && Object.hasOwn(ofBodyReader, type)) {
    return new Refusal(ofBodyReader[type]!);
  }
  const causeCode = (cause as { code?: unknown } | undefined)?.code ?? code;
  const words = `${String(message)} ${String((cause as Error | undefined)?.message)}`;
  if (
    (typeof causeCode === 'string' && awayCodes.has(causeCode)) ||
    /connection (terminated|timeout)|timeout exceeded when trying to connect/i.test(words)
  ) {
    return new Refusal('unavailable', { retryAfter: WAIT_WHEN_UNAVAILABLE });
  }
  // A value that no column can hold, as a NUL in a text: what was sent can't be right.
  if (typeof causeCode === 'string' && /^22[0-9A-Z]{3}$/.test(causeCode)) {
    return new Refusal('invalid_request');
  }
  // Express' own errors (a path that can't be decoded, a range that can't be satisfied).
  if (typeof status === 'number' && status >= 400 && status < 500) {
    return new Refusal(status === 404 ? 'not_found' : 'invalid_request');
  }
  return undefined;
}

/** The problem details of any thrown value. */
export function problemOf(thrown: unknown): Problem {
  const refusal = refusalOf(thrown) ?? new Refusal('internal');
  const status = statuses[refusal.code] ?? (refusal.code.includes('.') ? STATUS_OF_FEATURES : 500);
  const details = refusal.details;
  return {
    type: 'about:blank',
    title: STATUS_CODES[status] ?? 'Error',
    status,
    code: refusal.code,
    detail: sentenceOf(refusal.code, details),
    ...(Object.keys(details).length > 0 ? { details } : {}),
    ...(refusal instanceof InvalidRequest ? { fields: refusal.fields } : {}),
    requestId: requestId.getStore() ?? '',
  };
}

/** The one translator at the edge. No stack and no message of an unexpected error leaves. */
export const translateErrors =
  (logger: Logger): ErrorRequestHandler =>
  (thrown: unknown, request, response, next) => {
    const problem = problemOf(thrown);
    if (problem.status >= 500) {
      logger.error({ err: thrown, requestId: problem.requestId, path: request.path }, problem.code);
    }
    if (response.headersSent) {
      next(thrown);
      return;
    }
    const wait = problem.details?.['retryAfter'];
    if (typeof wait === 'number') response.setHeader('Retry-After', Math.ceil(wait));
    response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
  };

/** Last of the API's handlers: nothing is at this address. */
export const nothingHere: RequestHandler = () => {
  throw new Refusal('not_found');
};
