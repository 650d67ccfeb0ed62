/**
 * A section of strands: area, mass, bounds of bending stiffness and breaking load from count and type.
 *
 * Bending stiffness lies between strands that slide freely on each other (the sum of their own stiffness) and a section
 * that is fully bonded (common practice); the bonded bundle is taken as a solid circle of the packed steel, its second
 * moment I = A²/(4π φ) with the density φ of steel within the outline.
 */
import { assertRange, EstimationError } from '../errors.ts';
import { type StrandType, strandCatalogue } from './catalogue.ts';

/** What a section of strands amounts to. */
export interface StrandSection {
  /** m² */
  steelArea: number;
  /** Pa */
  modulus: number;
  /** kg/m, of the strands alone (of sheathed ones with sheath and wax). */
  steelMass: number;
  /** N */
  breakingLoad: number;
  /** EA, N */
  axialStiffness: number;
  /** N·m²: strands sliding freely, fully bonded. */
  bendingStiffnessBounds: [number, number];
  source: string;
}

/** Steel over outline of a seven-wire strand: seven circles in one of three times their diameter, 7/9 (geometry). */
const strandDensity = 7 / 9;
/** Round parts over the outline of their hexagonal bundle, about 0.85 with the gaps at its rim (geometry). */
const packingDensity = 0.85;

/**
 * Section of `count` strands of a catalogue type.
 *
 * @param type key of the catalogue, or a strand of your own
 * @param count number of strands, integer from 1 to 1000
 * @returns area (m²), mass (kg/m), breaking load (N), axial stiffness (N) and bounds of bending stiffness (N·m²)
 * @throws EstimationError `missing` for an unknown type, `out-of-range` for the count
 * Source: catalogue entry; bounds of bending stiffness are common practice.
 */
export function strandSection(type: string | StrandType, count: number): StrandSection {
  const strand = typeof type === 'string' ? strandCatalogue.find(({ key }) => key === type) : type;
  if (!strand) throw new EstimationError('missing', 'type', `The catalogue has no strand called “${String(type)}”.`);
  assertRange(count, 'count', 1, 1000);
  if (!Number.isInteger(count))
    throw new EstimationError('out-of-range', 'count', `A section has a whole number of strands, not ${count}.`);
  const steelArea = count * strand.area;
  return {
    steelArea,
    modulus: strand.modulus,
    steelMass: count * strand.massPerLength,
    breakingLoad: count * strand.breakingLoad,
    axialStiffness: strand.modulus * steelArea,
    bendingStiffnessBounds: [slidingStiffness(strand, count), bondedStiffness(strand, steelArea, count)],
    source: strand.source,
  };
}

/**
 * Sum of the parts' own stiffness: strands of a bundle, or the wires of a lone strand. The wires of a strand in a bundle are
 * pressed together by their lay, so that there each strand bends as one.
 */
function slidingStiffness(strand: StrandType, count: number): number {
  const wireArea = strand.area / strand.wireCount;
  const wires = strand.wireCount * (wireArea ** 2 / (4 * Math.PI));
  if (count === 1 || strand.wireCount === 1) return count * strand.modulus * wires;
  return (count * strand.modulus * strand.area ** 2) / (4 * Math.PI * strandDensity);
}

function bondedStiffness(strand: StrandType, steelArea: number, count: number): number {
  if (count === 1 && strand.wireCount === 1) return slidingStiffness(strand, 1);
  const density = count === 1 ? strandDensity : strand.wireCount === 1 ? packingDensity : strandDensity * packingDensity;
  return (strand.modulus * steelArea ** 2) / (4 * Math.PI * density);
}

/**
 * Bending stiffness of a solid round bar, the one section without slip.
 *
 * @param diameter m, > 0
 * @param modulus Pa, > 0
 * @returns E π d⁴/64, N·m²
 * @throws EstimationError `out-of-range` naming the field
 * Source: second moment of area of a circle.
 */
export function roundBarStiffness(diameter: number, modulus: number): number {
  assertRange(diameter, 'diameter', 0, 10, true);
  assertRange(modulus, 'modulus', 0, 1e13, true);
  return (modulus * Math.PI * diameter ** 4) / 64;
}
