/** Nothing is ever certain: what rounds to 100 in 100 is said as more than 99. */
export function inHundred(probability: number): string {
  const percent = probability * 100;
  if (percent > 99) return $localize`more than 99 in 100`;
  if (percent < 0.1) return $localize`under 0.1 in 100`;
  const figure = percent.toFixed(percent < 10 ? 1 : 0);
  return $localize`${figure}:percent: in 100`;
}
