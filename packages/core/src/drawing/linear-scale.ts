/**
 * A linear map of values to a coordinate of the sheet.
 *
 * @param domain smallest and largest value; alike values are spread so that the map stays finite
 * @param range where they lie on the sheet
 */
export function linearScale(domain: readonly [number, number], range: readonly [number, number]): (value: number) => number {
  const [from, to] = domain[0] === domain[1] ? [domain[0] - 0.5, domain[1] + 0.5] : domain;
  const slope = (range[1] - range[0]) / (to - from);
  return (value) => range[0] + (value - from) * slope;
}

/**
 * Round values between two bounds, for the ticks of an axis: steps of 1, 2 or 5 times a power of ten.
 *
 * @param from smallest value, finite
 * @param to largest value, finite, > from
 * @param count about how many, >= 1
 * @returns ascending values within the bounds; empty where the bounds are not in order
 */
export function roundTicks(from: number, to: number, count: number): number[] {
  if (!(to > from) || !Number.isFinite(to - from)) return [];
  const step = roundStep((to - from) / count);
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  // Multiples of the step, not sums of it: sums drift.
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => {
    const value = Number(((first + index) * step).toPrecision(12));
    return value === 0 ? 0 : value;
  });
}

/** The smallest of 1, 2, 5 × 10^k that is not less than the given step. */
export function roundStep(atLeast: number): number {
  const power = 10 ** Math.floor(Math.log10(atLeast));
  const lead = atLeast / power;
  const round = [1, 2, 5, 10].find((candidate) => candidate >= lead * (1 - 1e-9)) ?? 10;
  return round * power;
}

/** A tick's value with the digits that its step asks for and a real minus sign. */
export function tickLabel(value: number, step: number): string {
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const digits = Math.abs(value).toFixed(Math.min(decimals, 12));
  return value < 0 ? `\u2212${digits}` : digits;
}
