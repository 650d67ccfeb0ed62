import type { Measurement, ModalPeak } from '@strandnote/api/contract';
import type { schema } from '@strandnote/db';

type MeasurementRow = typeof schema.measurements.$inferSelect;
type PeakRow = typeof schema.modalPeaks.$inferSelect;

/** @param nameOf the name of a member by user */
export function toMeasurement(row: MeasurementRow, peaks: PeakRow[], nameOf: (userId: string) => string): Measurement {
  return {
    id: row.id,
    campaignId: row.campaignId,
    spanId: row.spanId,
    visitedAt: row.visitedAt.toISOString(),
    sensorPosition: row.sensorPosition,
    excitation: row.excitation,
    lowerDamperState: row.lowerDamperState,
    upperDamperState: row.upperDamperState,
    bushingState: row.bushingState,
    crossTied: row.crossTied,
    steelTemperature: row.steelTemperature,
    note: row.note,
    peaks: peaks.map(toPeak),
    version: row.version,
    enteredBy: nameOf(row.enteredBy),
  };
}

function toPeak(row: PeakRow): ModalPeak {
  const { id, mode, frequency, standardUncertainty, plane, source, used, setAsideReason } = row;
  return { id, mode, frequency, standardUncertainty, plane, source, used, setAsideReason };
}
