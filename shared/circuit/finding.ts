/**
 * What a check has to say about data: a code, where, and details for the sentence.
 * Sentences are in `shared/contract/sentences.ts`; checks return findings and never throw.
 */
export interface CheckFinding {
  readonly code: string;
  readonly severity: 'error' | 'warning';
  /** Path into the checked data, e.g. `parts.3.between.1`, or a tag or part name. */
  readonly at: string;
  readonly details?: Readonly<Record<string, string | number>>;
}
