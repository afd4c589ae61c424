/** Serialisation, deadlock, and two devices that opened one case at the same moment. */
const passing = new Set(['40001', '40P01', '23505']);

/** Whether the same transaction may well succeed when it is tried again. */
export function isPassing(error: unknown): boolean {
  const { code, cause } = (error ?? {}) as { code?: unknown; cause?: unknown };
  if (typeof code === 'string' && passing.has(code)) return true;
  return cause !== undefined && isPassing(cause);
}
