import type { CreateCable, CreateSection, CreateStructure, Point } from '@strandnote/api/contract';

/**
 * An invented county with two invented bridges. Nothing here was measured: geometry and loads are made up so that the
 * tensions come out like those of bridges of this size, and the frequencies are simulated from them (simulate-survey.ts).
 */

type Section = Omit<CreateSection, 'id'>;
type Span = CreateCable['spans'][number];
export interface DemonstrationCable {
  cable: Omit<CreateCable, 'id' | 'sectionId' | 'spans'>;
  span: Omit<Span, 'id'>;
  section: Section;
  /** Tension that the designer gives for the finished bridge (N). */
  designTension: number;
}
export interface DemonstrationStructure {
  structure: Omit<CreateStructure, 'id' | 'clientId'>;
  cables: DemonstrationCable[];
}

const strand = { area: 150e-6, mass: 1.3, breakingLoad: 279e3, diameter: 15.7e-3, modulus: 195e9 };

/** A parallel-strand stay of sheathed monostrand in a plastic pipe. */
function staySection(strands: number): Section {
  const own = strands * strand.modulus * ((Math.PI / 64) * strand.diameter ** 4);
  const outline = strand.area * strands * 1.35;
  return {
    name: `${strands} × 15.7 mm sheathed strand`,
    strandKey: 'y1860s7-15.7-sheathed',
    strandCount: strands,
    steelArea: strands * strand.area,
    modulus: strand.modulus,
    modulusSource: 'supplier',
    steelMass: strands * strand.mass,
    steelMassSource: 'supplier',
    sheathMass: 3.1 + 0.09 * strands,
    groutMass: 0,
    addedMassSource: 'supplier',
    massRelativeUncertainty: null,
    bendingStiffnessLow: own,
    bendingStiffnessHigh: Math.min(own * 60, (strand.modulus * outline ** 2) / (4 * Math.PI)),
    breakingLoad: strands * strand.breakingLoad,
    breakingLoadSource: 'supplier',
  };
}

/** A hanger of parallel 7 mm wires with a thin extruded sheath. */
function hangerSection(wires: number): Section {
  const area = wires * 38.5e-6;
  const own = wires * 205e9 * ((Math.PI / 64) * 7e-3 ** 4);
  const bonded = (205e9 * (area / 0.85) ** 2) / (4 * Math.PI);
  return {
    name: `${wires} × 7 mm parallel wire`,
    strandKey: 'wire-7',
    strandCount: wires,
    steelArea: area,
    modulus: 205e9,
    modulusSource: 'supplier',
    steelMass: wires * 0.302,
    steelMassSource: 'supplier',
    sheathMass: 1.4,
    groutMass: 0,
    addedMassSource: 'supplier',
    massRelativeUncertainty: null,
    bendingStiffnessLow: own,
    bendingStiffnessHigh: bonded,
    breakingLoad: area * 1670e6,
    breakingLoadSource: 'design',
  };
}

function chord(lower: Point, upper: Point): { length: number; inclination: number } {
  const run = Math.hypot(upper.x - lower.x, upper.y - lower.y);
  const rise = upper.z - lower.z;
  return { length: Math.hypot(run, rise), inclination: Math.atan2(rise, run) };
}

function spanBetween(
  lower: Point,
  upper: Point,
  held: Pick<Span, 'lowerEnd' | 'upperEnd' | 'lowerDamper' | 'damperPosition'>,
  deduction: number,
) {
  const { length, inclination } = chord(lower, upper);
  return {
    name: '',
    chordLength: Math.round(length * 1000) / 1000,
    chordLengthSource: 'as-built',
    chordLengthTolerance: 0.05,
    lowerDeduction: deduction,
    lowerDeductionTolerance: 0.05,
    upperDeduction: deduction,
    upperDeductionTolerance: 0.05,
    deductionSource: 'design',
    inclination,
    upperDamper: 'none',
    ...held,
  } satisfies Omit<Span, 'id'>;
}

const fanOffsets = [20, 36, 52, 68, 84];

/** Two towers with five stays a side in two planes: 40 stays. */
export function marrowFirthCrossing(): DemonstrationStructure {
  const towers = [
    { letter: 'W', x: -110 },
    { letter: 'E', x: 110 },
  ];
  const cables = towers.flatMap(({ letter, x }) =>
    (['u', 'd'] as const).flatMap((side) =>
      [...fanOffsets.map((offset) => -offset).reverse(), ...fanOffsets].map((offset, index) => {
        const y = side === 'u' ? 9.5 : -9.5;
        const lower = { x: x + offset, y, z: 0 };
        const upper = { x: x + Math.sign(offset) * 1.2, y: y * 0.4, z: 28 + 6 * fanOffsets.indexOf(Math.abs(offset)) };
        const { inclination } = chord(lower, upper);
        // Tributary deck of 16 m at about 52 kN/m a plane, the outermost a little more for the end of the fan.
        const designTension = roundTo(((Math.abs(offset) === 84 ? 980e3 : 830e3) as number) / Math.sin(inclination), 5e3);
        return {
          cable: {
            reference: `${letter}-${String(index + 1).padStart(2, '0')}${side}`,
            ownerReference: `MFC/${letter}${side.toUpperCase()}/${index + 1}`,
            paintedMark: `${letter}${index + 1}${side.toUpperCase()}`,
            kind: 'stay' as const,
            position: towers.findIndex((tower) => tower.letter === letter) * 20 + (side === 'u' ? 0 : 10) + index,
            lowerAnchor: lower,
            upperAnchor: upper,
            notes: '',
          },
          span: spanBetween(
            lower,
            upper,
            { lowerEnd: { kind: 'socket' }, upperEnd: { kind: 'socket' }, lowerDamper: 'none', damperPosition: null },
            1.15,
          ),
          section: staySection(Math.ceil(designTension / (0.4 * strand.breakingLoad))),
          designTension,
        };
      }),
    ),
  );
  return {
    structure: {
      name: 'Marrow Firth Crossing',
      reference: 'OC-114',
      kind: 'cable-stayed',
      ownerName: 'County of Orrinvale',
      place: 'Orrinvale (an invented county)',
      timeZone: 'Europe/London',
      elevation: {
        deck: [
          { x: -215, z: 0 },
          { x: 215, z: 0 },
        ],
        supports: towers.map(({ x }) => [
          { x, z: -22 },
          { x, z: 60 },
        ]),
      },
      notes: 'Invented for the demonstration. Frequencies are simulated.',
    },
    cables,
  };
}

/** A tied arch of 96 m with eleven hangers in two planes: 22 hangers, the outer ones short and stiff. */
export function tansyWeirBridge(): DemonstrationStructure {
  const span = 96;
  const rise = 17.5;
  const crown = (x: number) => 4 * rise * (x / span) * (1 - x / span);
  const cables = (['n', 's'] as const).flatMap((side) =>
    Array.from({ length: 11 }, (_, index) => {
      const x = 8 * (index + 1);
      const y = side === 'n' ? 6 : -6;
      const lower = { x, y, z: 0 };
      const upper = { x, y, z: crown(x) };
      return {
        cable: {
          reference: `H-${String(index + 1).padStart(2, '0')}${side}`,
          ownerReference: `TWB/${side.toUpperCase()}${index + 1}`,
          paintedMark: `${index + 1}${side.toUpperCase()}`,
          kind: 'hanger' as const,
          position: (side === 'n' ? 0 : 11) + index,
          lowerAnchor: lower,
          upperAnchor: upper,
          notes: '',
        },
        span: spanBetween(
          lower,
          upper,
          { lowerEnd: { kind: 'fork-across' }, upperEnd: { kind: 'fork-across' }, lowerDamper: 'none', damperPosition: null },
          0.35,
        ),
        section: hangerSection(55),
        designTension: index === 0 || index === 10 ? 410e3 : 470e3,
      };
    }),
  );
  return {
    structure: {
      name: 'Tansy Weir Bridge',
      reference: 'OC-027',
      kind: 'arch',
      ownerName: 'County of Orrinvale',
      place: 'Orrinvale (an invented county)',
      timeZone: 'Europe/London',
      elevation: {
        deck: [
          { x: -6, z: 0 },
          { x: span + 6, z: 0 },
        ],
        supports: [Array.from({ length: 25 }, (_, index) => ({ x: index * 4, z: crown(index * 4) }))],
      },
      notes: 'Invented for the demonstration. Frequencies are simulated.',
    },
    cables,
  };
}

function roundTo(value: number, step: number): number {
  return Math.round(value / step) * step;
}
