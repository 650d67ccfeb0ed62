import type { Measurement, ModalPeak, PutMeasurement } from '@strandnote/api/contract';
import { canonicalJson } from '../reports/canonical-json.ts';

const visitFields = [
  'spanId',
  'visitedAt',
  'sensorPosition',
  'excitation',
  'lowerDamperState',
  'upperDamperState',
  'bushingState',
  'crossTied',
  'steelTemperature',
  'note',
] as const;

/**
 * What a measurement as sent changes in the one stored: for the audit trail, each field and each peak with its value before
 * and after (null where there was or is none). Empty when nothing changes; a new measurement changes everything.
 */
export function measurementChanges(stored: Measurement | null, sent: PutMeasurement): Record<string, { from: unknown; to: unknown }> {
  const before = stored && { ...stored, visitedAt: instant(stored.visitedAt) };
  const after = { ...sent, visitedAt: instant(sent.visitedAt) };
  const fields = visitFields.map((name) => [name, before?.[name] ?? null, after[name] ?? null] as const);
  const peaks = peakChanges(stored?.peaks ?? [], sent.peaks);
  const changed = [...fields, ...peaks].filter(([, from, to]) => canonicalJson(from) !== canonicalJson(to));
  return Object.fromEntries(changed.map(([name, from, to]) => [name, { from, to }]));
}

/** The same moment may be written with another offset. */
function instant(time: string): string {
  return new Date(time).toISOString();
}

function peakChanges(before: ModalPeak[], after: ModalPeak[]): (readonly [string, ModalPeak | null, ModalPeak | null])[] {
  const ids = new Set([...before, ...after].map(({ id }) => id));
  return [...ids].map((id) => {
    const was = before.find((peak) => peak.id === id) ?? null;
    const is = after.find((peak) => peak.id === id) ?? null;
    return [`peak ${id}`, was, is] as const;
  });
}
