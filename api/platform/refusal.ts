/** Why a request is not served: the key of a sentence. HTTP's status is chosen at the edge. */
export type RefusalCode =
  | 'not_found'
  | 'not_signed_in'
  | 'not_allowed'
  | 'wrong_credentials'
  | 'too_many_attempts'
  | 'busy'
  | 'unavailable'
  | 'cross_site'
  | 'invalid_request'
  | 'malformed_json'
  | 'unsupported_media_type'
  | 'body_too_large'
  | 'version_missing'
  | 'version_conflict'
  | 'key_missing'
  | 'key_reused'
  | 'internal'
  /** Of a feature, as `people.last_administrator`. */
  | `${string}.${string}`;

/**
 * Thrown by use cases where a request can't be served as asked; the translator at the edge makes
 * problem details of it. `details` go to the client: nothing secret in them.
 */
export class Refusal extends Error {
  override readonly name = 'Refusal';

  constructor(
    readonly code: RefusalCode,
    readonly details: Readonly<Record<string, unknown>> = {},
  ) {
    super(code);
  }
}

/** The thing, or `not_found`. A row of another organisation is not seen at all: the same answer. */
export function found<T>(thing: T | undefined): T {
  if (thing === undefined) throw new Refusal('not_found');
  return thing;
}
