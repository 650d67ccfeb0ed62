import type { Measurement, PutMeasurement, Span } from '@strandnote/api/contract';
import { toPeak } from './check-entry.ts';
import { type EntryDraft, isBlank, modeOf } from './entry-draft.ts';
import { readInstant } from './visit-time.ts';

/** What is sent of a draft without problems: rows left empty are not part of it. */
export function measurementBody(draft: EntryDraft, span: Span, timeZone: string): PutMeasurement {
  const { visit } = draft;
  return {
    spanId: span.id,
    version: draft.version,
    visitedAt: readInstant(visit.visitedAt, timeZone)!,
    sensorPosition: visit.sensor.si,
    excitation: visit.excitation!,
    lowerDamperState: visit.lowerDamper!,
    upperDamperState: visit.upperDamper!,
    bushingState: visit.bushing!,
    crossTied: visit.crossTied === 'yes',
    steelTemperature: visit.steelTemperature.si,
    note: visit.note.trim(),
    peaks: draft.peaks.filter((peak) => !isBlank(peak)).map((peak) => toPeak(peak, modeOf(peak)!)),
  };
}

/** The same as it will stand in the checklist once it is stored. */
export function measurementOf(body: PutMeasurement, place: { id: string; campaignId: string; enteredBy: string }): Measurement {
  return { ...body, ...place };
}
