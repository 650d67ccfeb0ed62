import { type Cable, type ModalPeak, naturalFrequencies, strandSection, surveyedCable } from '@strandnote/core';
import type { FrozenMeasurement } from '@strandnote/core/report-content';

/**
 * The stays of an invented bridge, and what a survey reads at them: frequencies simulated from the core's own models, with
 * noise. Every story of a cable that a report has to tell happens to one of them.
 */

type Story =
  | 'plain'
  | 'high'
  | 'slightly-high'
  | 'near-the-limit'
  | 'not-measured'
  | 'two-poor-peaks'
  | 'other-stage'
  | 'no-reference'
  | 'wrong-mode'
  | 'damped';

/** What happens to the cables of the bridge, by their place in the survey; the others are as they should be. */
const stories: Record<number, Story> = {
  1: 'high',
  2: 'near-the-limit',
  3: 'slightly-high',
  4: 'not-measured',
  5: 'two-poor-peaks',
  6: 'other-stage',
  7: 'no-reference',
  8: 'wrong-mode',
  9: 'damped',
  40: 'not-measured',
};
const trueOverDesign: Partial<Record<Story, number>> = { high: 1.135, 'slightly-high': 1.072, 'near-the-limit': 1.042 };

export const section = {
  ...strandSection('y1860s7-15.7', 37),
  steelMassSource: 'supplier',
  sheathMass: 6.4,
  groutMass: 0,
  addedMassSource: 'supplier',
  massRelativeUncertainty: null,
} as const;
export const surveyedSection = {
  ...section,
  bendingStiffnessLow: section.bendingStiffnessBounds[0],
  bendingStiffnessHigh: section.bendingStiffnessBounds[1],
};

export interface Stay {
  index: number;
  reference: string;
  lower: { x: number; y: number; z: number };
  upper: { x: number; y: number; z: number };
  design: number;
  story: Story;
}

export function stays(): Stay[] {
  const offsets = [18, 32, 46, 60, 74, 88, 102];
  const fan = [...offsets.map((offset) => -offset).reverse(), ...offsets];
  const places = [
    { letter: 'W', x: -125 },
    { letter: 'E', x: 125 },
  ].flatMap(({ letter, x }) => (['u', 'd'] as const).flatMap((side) => fan.map((offset, order) => ({ letter, x, side, offset, order }))));
  return places.map(({ letter, x, side, offset, order }, index): Stay => {
    const y = side === 'u' ? 10.5 : -10.5;
    const lower = { x: x + offset, y, z: 0 };
    const upper = { x: x + Math.sign(offset) * 1.1, y: y * 0.4, z: 30 + 5.5 * offsets.indexOf(Math.abs(offset)) };
    const { inclination } = chordOf({ lower, upper });
    const reference = `${letter}-${String(order + 1).padStart(2, '0')}${side}`;
    return {
      index,
      reference,
      lower,
      upper,
      design: Math.round(1.9e6 / Math.sin(inclination) / 1e4) * 1e4,
      story: stories[index] ?? 'plain',
    };
  });
}

export function chordOf({ lower, upper }: Pick<Stay, 'lower' | 'upper'>) {
  const [run, rise] = [Math.hypot(upper.x - lower.x, upper.y - lower.y), upper.z - lower.z];
  return { length: Math.hypot(run, rise), inclination: Math.atan2(rise, run), rise };
}

export function spanOf(stay: Stay) {
  const chord = chordOf(stay);
  return {
    chordLength: Math.round(chord.length * 1000) / 1000,
    chordLengthTolerance: 0.03,
    lowerDeduction: 1.25,
    lowerDeductionTolerance: 0.05,
    upperDeduction: 0.9,
    upperDeductionTolerance: 0.05,
    inclination: chord.inclination,
    lowerEnd: { kind: 'socket' },
    upperEnd: { kind: 'unknown' },
    damperPosition: stay.story === 'damped' ? 1.6 : null,
  } as const;
}

export function visitOf(stay: Stay) {
  return {
    lowerDamperState: stay.story === 'damped' ? 'connected' : 'none',
    upperDamperState: 'none',
    bushingState: 'none',
    crossTied: false,
  } as const;
}

type Peak = FrozenMeasurement['peaks'][number];

/** Frequencies of the true cable with noise of 0.15 %, as a survey reads them. */
export function peaksOf(stay: Stay): Peak[] {
  const cable: Cable = {
    ...surveyedCable(surveyedSection, spanOf(stay), { ...visitOf(stay), lowerDamperState: 'none' }),
    ends: [{ fixity: [0.9, 0.9] }, { fixity: [0.75, 0.75] }],
  };
  const tension = stay.design * (trueOverDesign[stay.story] ?? 1 + 0.012 * Math.sin(stay.index * 1.7));
  const bendingStiffness = Math.sqrt(surveyedSection.bendingStiffnessLow * surveyedSection.bendingStiffnessHigh);
  const frequencies = naturalFrequencies(cable, { tension, bendingStiffness }, 8);
  const noise = seededNoise(stay.index + 1);
  const read = frequencies.map((frequency, order) => ({
    mode: order + 1,
    frequency: Number((frequency * (1 + 0.0015 * noise())).toFixed(4)),
  }));
  if (stay.story === 'two-poor-peaks') return read.slice(0, 2).map((peak) => toPeak(peak, { standardUncertainty: 0.11 * peak.frequency }));
  if (stay.story === 'wrong-mode')
    return [...read.slice(0, 3), { mode: 4, frequency: Number((read[3]!.frequency * 1.021).toFixed(4)) }, ...read.slice(4, 6)].map((peak) =>
      toPeak(peak, { standardUncertainty: Number((0.0015 * peak.frequency).toFixed(4)) }),
    );
  const foreign =
    stay.index % 6 === 2
      ? [
          toPeak(
            { mode: 9, frequency: 7.431 },
            { used: false, setAsideReason: 'A mode of the deck: it stands at the same place on the sister cable.' },
          ),
        ]
      : [];
  return [
    ...read.map((peak) => toPeak(peak, { source: 'record', standardUncertainty: Number((0.0015 * peak.frequency).toFixed(4)) })),
    ...foreign,
  ];
}

function toPeak(peak: { mode: number; frequency: number }, over: Partial<Peak> = {}): Peak {
  return { ...peak, standardUncertainty: null, plane: 'in-plane', source: 'typed', used: true, setAsideReason: null, ...over };
}

export function toModalPeak({ mode, frequency, standardUncertainty, plane }: Peak): ModalPeak {
  return { mode, frequency, plane, ...(standardUncertainty === null ? {} : { standardUncertainty }) };
}

/** Normal deviates that are the same in every run (Park and Miller's generator, Box and Muller's pairs). */
function seededNoise(seed: number): () => number {
  let state = (seed * 7919) % 2147483647;
  const uniform = () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}
