/** Serialisation, deadlock, and two devices that opened one case at the same moment. */
const passing = new Set(['40001', '40P01', '23505']);
/** Data exceptions, checks that fail, and values larger than any column. */
const unstorable = /^(22|54)[0-9A-Z]{3}$|^23514$/;

function anyCode(error: unknown, fits: (code: string) => boolean): boolean {
  const { code, cause } = (error ?? {}) as { code?: unknown; cause?: unknown };
  if (typeof code === 'string' && fits(code)) return true;
  return cause !== undefined && anyCode(cause, fits);
}

/** Whether the same transaction may well succeed when it is tried again. */
export const isPassing = (error: unknown): boolean => anyCode(error, (code) => passing.has(code));

/** Whether what was sent can never be stored, however often it is tried. */
export const isUnstorable = (error: unknown): boolean =>
  anyCode(error, (code) => unstorable.test(code));
