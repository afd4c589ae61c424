/** How much a generated test does: at each change, and in the long run (`npm run test:long`). */
export const amount = (eachChange: number, long: number): number =>
  process.env['LAMPLINE_TESTS'] === 'long' ? long : eachChange;
