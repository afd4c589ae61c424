/** The sentence of a code. */
export const sentence = (code: string, _details: Readonly<Record<string, unknown>>): string => code;
