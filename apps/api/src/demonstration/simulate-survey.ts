import type { ModalPeak, Section, Span } from '@strandnote/api/contract';
import { naturalFrequencies } from '@strandnote/core';
import type { SeededRandom } from './seeded-random.ts';

/** How a simulated cable really is: what no survey can see directly. */
export interface Truth {
  /** N */
  tension: number;
  /** Between the section's bounds: 0 is strands sliding freely, 1 fully bonded (of the logarithm). */
  bond: number;
  /** Fixity of both ends, 0 to below 1. */
  fixity: number;
}

/** Standard deviation of a simulated frequency, as a fraction. */
const noise = 0.0012;

/**
 * Modal peaks of a cable that does not exist: the core's own stiff-string model with sag, plus normal noise.
 * Simulated, and said to be so wherever the demonstration shows it.
 *
 * @returns one peak a mode (Hz), rounded to 0.001 Hz like a typed reading
 */
export function simulatePeaks(
  section: Omit<Section, 'id' | 'structureId'>,
  span: Omit<Span, 'id' | 'cableId' | 'position'>,
  truth: Truth,
  modeCount: number,
  random: SeededRandom,
): ModalPeak[] {
  const { bendingStiffnessLow: low, bendingStiffnessHigh: high } = section;
  const bendingStiffness = low * (high / low) ** truth.bond;
  const boundaryLayer = Math.sqrt(bendingStiffness / truth.tension);
  const rotationalStiffness = ((truth.fixity / (1 - truth.fixity)) * bendingStiffness) / boundaryLayer;
  const frequencies = naturalFrequencies(
    {
      length: span.chordLength - span.lowerDeduction - span.upperDeduction,
      massPerLength: section.steelMass + section.sheathMass + section.groutMass,
      axialStiffness: section.modulus * section.steelArea,
      inclination: span.inclination,
      ends: [{ rotationalStiffness }, { rotationalStiffness }],
    },
    { tension: truth.tension, bendingStiffness },
    modeCount,
  );
  return frequencies.map((frequency, index) => ({
    id: random.uuid(),
    mode: index + 1,
    frequency: Math.round(frequency * (1 + noise * random.normal()) * 1000) / 1000,
    standardUncertainty: null,
    plane: 'in-plane',
    source: 'typed',
    used: true,
    setAsideReason: null,
  }));
}
