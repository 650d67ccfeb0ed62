/**
 * Strands, wires and cable materials that a section can be built from. Every value is a default that can be edited; its
 * source is shown beside it.
 */

/** One strand or wire of the catalogue. */
export interface StrandType {
  key: string;
  name: string;
  /** Nominal diameter, m. */
  diameter: number;
  /** Steel area, m². */
  area: number;
  /** kg/m; of a sheathed strand with sheath and wax. */
  massPerLength: number;
  /** Characteristic breaking load, N. */
  breakingLoad: number;
  /** Pa, and its half-width (Pa) as quoted. */
  modulus: number;
  modulusTolerance: number;
  /** Wires in one strand, and the diameter of a wire (m): they give the bending stiffness of a strand that slides freely. */
  wireCount: number;
  wireDiameter: number;
  /** Whether the mass holds sheath and wax already. */
  sheathed: boolean;
  source: string;
}

const strandModulus = { modulus: 195e9, modulusTolerance: 10e9 } as const;
const astm = 'ASTM A416 grade 270';
const euronorm = 'prEN 10138-3 Y1860S7';

/** Strands and wires with their printed properties; the mass of the sheathed strand is common practice. */
export const strandCatalogue: readonly StrandType[] = [
  strand('astm-15.24', 'Seven-wire strand 15.24 mm (0.6 in)', 15.24, 140.0, 1.102, 260.7, astm),
  strand('astm-12.7', 'Seven-wire strand 12.7 mm (0.5 in)', 12.7, 98.7, 0.775, 183.7, astm),
  strand('y1860s7-15.2', 'Seven-wire strand 15.2 mm, Y1860S7', 15.2, 139, 1.086, 259, euronorm),
  strand('y1860s7-15.7', 'Seven-wire strand 15.7 mm, Y1860S7', 15.7, 150, 1.172, 279, euronorm),
  {
    ...strand('y1860s7-15.7-sheathed', 'Sheathed waxed strand 15.7 mm, Y1860S7', 15.7, 150, 1.3, 279, euronorm),
    sheathed: true,
    source: `${euronorm}; mass with sheath and wax about 1.3 kg/m (common practice)`,
  },
  {
    key: 'wire-7',
    name: 'Parallel wire 7 mm',
    diameter: 7e-3,
    area: 38.5e-6,
    massPerLength: 0.302,
    breakingLoad: 38.5e-6 * 1670e6,
    modulus: 205e9,
    modulusTolerance: 5e9,
    wireCount: 1,
    wireDiameter: 7e-3,
    sheathed: false,
    source: 'Area and mass of a 7 mm steel wire; modulus EN 1993-1-11 (quoted second-hand); breaking load at 1670 MPa, to be confirmed',
  },
];

function strand(key: string, name: string, diameter: number, area: number, mass: number, breakingLoad: number, source: string): StrandType {
  return {
    key,
    name,
    diameter: diameter * 1e-3,
    area: area * 1e-6,
    massPerLength: mass,
    breakingLoad: breakingLoad * 1e3,
    ...strandModulus,
    wireCount: 7,
    // Six wires around one: a third of the strand's diameter.
    wireDiameter: (diameter * 1e-3) / 3,
    sheathed: false,
    source,
  };
}

/** Elastic moduli of tension members, Pa with half-width. Source: EN 1993-1-11 (quoted second-hand). */
export const memberModuli = [
  { key: 'spiral-strand', name: 'Spiral strand', modulus: 150e9, tolerance: 10e9 },
  { key: 'locked-coil', name: 'Fully locked coil', modulus: 160e9, tolerance: 10e9 },
  { key: 'strand-rope', name: 'Strand rope', modulus: 100e9, tolerance: 10e9 },
  { key: 'parallel-wires', name: 'Parallel wires', modulus: 205e9, tolerance: 5e9 },
  { key: 'parallel-strands', name: 'Parallel strands', modulus: 195e9, tolerance: 5e9 },
] as const;

/** Thermal expansion of steel, 1/K. Source: EN 1993-1-11 (quoted second-hand). */
export const steelThermalExpansion = 12e-6;
