/** Standard acceleration of free fall (m/s²). */
const gravity = 9.80665;

/**
 * A reference tension brought to the mean chord: along an inclined cable the tension grows by the weight of the cable
 * below, so that the upper end carries m g Δh/2 more than the mean and the lower end as much less.
 *
 * @param value tension (N) at its place
 * @param massPerLength kg/m
 * @param rise height of the upper end above the lower (m)
 * @returns tension at the mean chord (N)
 */
export function tensionAtMeanChord(
  value: number,
  place: 'mean-chord' | 'lower-end' | 'upper-end',
  massPerLength: number,
  rise: number,
): number {
  const half = (massPerLength * gravity * rise) / 2;
  if (place === 'upper-end') return value - half;
  return place === 'lower-end' ? value + half : value;
}
