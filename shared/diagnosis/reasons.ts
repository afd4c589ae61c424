import type { Reason } from './advice';

/** A reason by its code; the sentence is in the contract's table. */
export const reason = (code: string, more: Partial<Reason> = {}): Reason => ({
  code,
  tags: [],
  parts: [],
  numbers: {},
  observations: [],
  ...more,
});
