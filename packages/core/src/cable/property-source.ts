/** Where a property of a cable comes from. */
export type PropertySource = 'weighed' | 'supplier' | 'as-built' | 'design' | 'taped' | 'assumed';

/**
 * Relative standard uncertainty of a mass per length by its source. Common practice, without a published source; every
 * value can be replaced. A drawing, as built or of the design, gives what was ordered, not what a grouting left behind.
 */
const massUncertainty: Record<PropertySource, number> = {
  weighed: 0.005,
  supplier: 0.01,
  'as-built': 0.03,
  design: 0.03,
  taped: 0.03,
  assumed: 0.05,
};

/** Relative standard uncertainty of the mass of a grouted section: the filling cannot be seen (common practice). */
export const groutedRelativeUncertainty = 0.05;

/**
 * Half-widths (m) of the rectangular distribution of a length by its source: what a careful crew keeps to. Common
 * practice, without a published source; every value can be replaced.
 */
const lengthTolerance: Record<PropertySource, number> = {
  weighed: 0.02,
  supplier: 0.01,
  'as-built': 0.02,
  design: 0.05,
  taped: 0.01,
  assumed: 0.2,
};

/**
 * Relative standard uncertainty that follows from where a mass, area or modulus comes from.
 *
 * @param source where the value comes from
 * @returns standard uncertainty as a fraction of the value; never zero
 */
export function defaultRelativeUncertainty(source: PropertySource): number {
  return massUncertainty[source];
}

/**
 * Tolerance of a length that follows from where it comes from.
 *
 * @param source where the length comes from
 * @returns half-width of a rectangular distribution (m); its standard uncertainty is this over √3 (JCGM 100:2008, 4.3.7)
 */
export function defaultLengthTolerance(source: PropertySource): number {
  return lengthTolerance[source];
}
