import type { Problem } from '@shared/contract';

/** A request that failed: `code` is the key of the sentence, `detail` the sentence. Status 0: no answer. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    readonly detail: string,
    readonly fields: NonNullable<Problem['fields']> = [],
    readonly details: Readonly<Record<string, unknown>> = {},
    readonly retryAfterSeconds?: number,
  ) {
    super(detail);
  }

  /** The sentence beside a field, if the server has one. */
  at(field: string): string | undefined {
    return this.fields.find((entry) => entry.field === field)?.detail;
  }
}
