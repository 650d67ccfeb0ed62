import { z } from 'zod';
import { id, isoTime, optionalText, quantity, typedText } from './primitives.ts';

export const dampingState = z.enum(['none', 'connected', 'disconnected', 'locked', 'leaking']);
export type DampingState = z.infer<typeof dampingState>;

export const excitation = z.enum(['ambient', 'wind', 'traffic', 'mallet', 'pull-release']);

export const plane = z.enum(['in-plane', 'out-of-plane']);

/** A natural frequency that was read: used in the fit, or set aside with a reason. */
export const modalPeak = z
  .strictObject({
    id,
    mode: z.number().int('A mode number is a whole number.').min(1, 'Mode numbers start at 1.').max(60, 'Mode numbers go up to 60.'),
    frequency: quantity('The frequency', { above: 0, to: 100_000 }),
    standardUncertainty: quantity('The uncertainty of the frequency', { above: 0, to: 1000 }).nullable(),
    plane,
    source: z.enum(['typed', 'record']),
    used: z.boolean(),
    setAsideReason: typedText(300).nullable(),
  })
  .refine((peak) => peak.used || peak.setAsideReason !== null, {
    path: ['setAsideReason'],
    message: 'Say why this peak is set aside.',
  });
export type ModalPeak = z.infer<typeof modalPeak>;

const measurementFields = {
  spanId: id,
  visitedAt: isoTime,
  /** Distance of the sensor from the lower end of the free length (m). */
  sensorPosition: quantity('The position of the sensor', { from: 0, to: 3000 }).nullable(),
  excitation,
  lowerDamperState: dampingState,
  upperDamperState: dampingState,
  bushingState: dampingState,
  crossTied: z.boolean(),
  steelTemperature: quantity('The steel temperature', { from: -60, to: 90 }).nullable(),
  note: optionalText(1000),
  peaks: z.array(modalPeak).max(60, 'At most 60 peaks.'),
};

/** Creates or replaces a measurement whole, with its peaks. `version` is the one that was seen, 0 for a new one. */
export const putMeasurement = z.strictObject({ ...measurementFields, version: z.number().int().min(0) }).superRefine((entry, context) => {
  const seen = new Map<string, number>();
  for (const [index, peak] of entry.peaks.entries()) {
    if (!peak.used) continue;
    const key = `${peak.plane} ${peak.mode}`;
    if (seen.has(key)) {
      context.addIssue({
        code: 'custom',
        path: ['peaks', index, 'mode'],
        message: `Mode ${peak.mode} is entered twice. Keep one, or set one aside.`,
      });
    }
    seen.set(key, index);
  }
});
export type PutMeasurement = z.infer<typeof putMeasurement>;

export const measurement = z.object({
  id,
  campaignId: id,
  ...measurementFields,
  peaks: z.array(modalPeak),
  version: z.number().int(),
  enteredBy: z.string(),
});
export type Measurement = z.infer<typeof measurement>;
