import type { DampingState, Measurement, UnitSystem } from '@strandnote/api/contract';
import { emptyEntry, enteredValue, type QuantityEntry, readEntry } from '../../lib/quantity-entry.ts';
import type { Excitation, Plane } from './site-words.ts';
import { instantText } from './visit-time.ts';

/** A row of the entry form: everything as it was typed. */
export interface PeakDraft {
  id: string;
  mode: string;
  frequency: QuantityEntry;
  uncertainty: QuantityEntry;
  plane: Plane;
  source: 'typed' | 'record';
  used: boolean;
  setAsideReason: string;
}

/** What the visit found; null where the question is not answered yet, since nothing is answered for the person. */
export interface VisitDraft {
  visitedAt: string;
  sensor: QuantityEntry;
  excitation: Excitation | null;
  lowerDamper: DampingState | null;
  upperDamper: DampingState | null;
  bushing: DampingState | null;
  crossTied: 'yes' | 'no' | null;
  steelTemperature: QuantityEntry;
  note: string;
}

/** A measurement as it is being typed, kept on the device with every keystroke. */
export interface EntryDraft {
  measurementId: string;
  /** The version that this began from, 0 for a new measurement. */
  version: number;
  system: UnitSystem;
  peaks: PeakDraft[];
  visit: VisitDraft;
}

export type EntryAction =
  | { type: 'peakChanged'; id: string; change: Partial<Omit<PeakDraft, 'id'>> }
  | { type: 'peakAdded' }
  | { type: 'peakRemoved'; id: string }
  | { type: 'columnPasted'; id: string; frequencies: string[] }
  | { type: 'peaksRenumbered'; modes: Record<string, number | null> }
  | { type: 'visitAnswered'; change: Partial<VisitDraft> };

/** Six modes are a good day's reading; rows left empty are not saved. */
const rowsAtFirst = 6;

export function newDraft({ system, now, timeZone }: { system: UnitSystem; now: Date; timeZone: string }): EntryDraft {
  return {
    measurementId: crypto.randomUUID(),
    version: 0,
    system,
    peaks: Array.from({ length: rowsAtFirst }, (_, index) => emptyPeak(index + 1)),
    visit: {
      visitedAt: instantText(now.toISOString(), timeZone),
      sensor: emptyEntry,
      excitation: null,
      lowerDamper: null,
      upperDamper: null,
      bushing: null,
      crossTied: null,
      steelTemperature: emptyEntry,
      note: '',
    },
  };
}

/** A stored measurement, opened to be changed. */
export function draftOf(measurement: Measurement, { system, timeZone }: { system: UnitSystem; timeZone: string }): EntryDraft {
  return {
    measurementId: measurement.id,
    version: measurement.version,
    system,
    peaks: measurement.peaks.map((peak) => ({
      id: peak.id,
      mode: String(peak.mode),
      frequency: enteredValue(peak.frequency, 'frequency', system),
      uncertainty: enteredValue(peak.standardUncertainty, 'frequency', system),
      plane: peak.plane,
      source: peak.source,
      used: peak.used,
      setAsideReason: peak.setAsideReason ?? '',
    })),
    visit: {
      visitedAt: instantText(measurement.visitedAt, timeZone),
      sensor: enteredValue(measurement.sensorPosition, 'length', system),
      excitation: measurement.excitation,
      lowerDamper: measurement.lowerDamperState,
      upperDamper: measurement.upperDamperState,
      bushing: measurement.bushingState,
      crossTied: measurement.crossTied ? 'yes' : 'no',
      steelTemperature: enteredValue(measurement.steelTemperature, 'temperature', system),
      note: measurement.note,
    },
  };
}

/** A draft that was typed in other units means what it meant then. */
export function inSystem(draft: EntryDraft, system: UnitSystem): EntryDraft {
  if (draft.system === system) return draft;
  const { sensor, steelTemperature } = draft.visit;
  return {
    ...draft,
    system,
    visit: {
      ...draft.visit,
      sensor: sensor.si === null ? sensor : enteredValue(sensor.si, 'length', system),
      steelTemperature: steelTemperature.si === null ? steelTemperature : enteredValue(steelTemperature.si, 'temperature', system),
    },
  };
}

export function reduceDraft(draft: EntryDraft, action: EntryAction): EntryDraft {
  switch (action.type) {
    case 'peakChanged':
      return { ...draft, peaks: draft.peaks.map((peak) => (peak.id === action.id ? { ...peak, ...action.change } : peak)) };
    case 'peakAdded':
      return { ...draft, peaks: [...draft.peaks, emptyPeak(nextMode(draft.peaks))] };
    case 'peakRemoved':
      return { ...draft, peaks: draft.peaks.filter(({ id }) => id !== action.id) };
    case 'columnPasted':
      return { ...draft, peaks: withColumn(draft.peaks, action.id, action.frequencies) };
    case 'peaksRenumbered':
      return {
        ...draft,
        peaks: draft.peaks.map((peak) => renumbered(peak, action.modes[peak.id])),
      };
    case 'visitAnswered':
      return { ...draft, visit: { ...draft.visit, ...action.change } };
  }
}

/** A foreign peak keeps its number and is set aside. */
function renumbered(peak: PeakDraft, mode: number | null | undefined): PeakDraft {
  if (mode === undefined) return peak;
  return mode === null ? { ...peak, used: false, setAsideReason: 'foreign peak' } : { ...peak, mode: String(mode) };
}

/** The answers that are alike from cable to cable on a day; the person says so with one touch. */
export function answersOf(measurement: Measurement, system: UnitSystem): Partial<VisitDraft> {
  return {
    excitation: measurement.excitation,
    lowerDamper: measurement.lowerDamperState,
    upperDamper: measurement.upperDamperState,
    bushing: measurement.bushingState,
    crossTied: measurement.crossTied ? 'yes' : 'no',
    sensor: enteredValue(measurement.sensorPosition, 'length', system),
    steelTemperature: enteredValue(measurement.steelTemperature, 'temperature', system),
  };
}

/** Mode number of a row, or null where what is typed is none. */
export function modeOf({ mode }: PeakDraft): number | null {
  return /^\s*\d{1,3}\s*$/.test(mode) ? Number(mode) : null;
}

/** A row that says nothing yet. */
export function isBlank({ frequency, uncertainty }: PeakDraft): boolean {
  return frequency.text.trim() === '' && uncertainty.text.trim() === '';
}

function emptyPeak(mode: number): PeakDraft {
  return {
    id: crypto.randomUUID(),
    mode: String(mode),
    frequency: emptyEntry,
    uncertainty: emptyEntry,
    plane: 'in-plane',
    source: 'typed',
    used: true,
    setAsideReason: '',
  };
}

function nextMode(peaks: readonly PeakDraft[]): number {
  return Math.max(0, ...peaks.map((peak) => modeOf(peak) ?? 0)) + 1;
}

/** Fills the rows from the one that was pasted into; rows that are missing are added. */
function withColumn(peaks: readonly PeakDraft[], id: string, frequencies: readonly string[]): PeakDraft[] {
  const from = Math.max(
    0,
    peaks.findIndex((peak) => peak.id === id),
  );
  const filled = [...peaks];
  for (const [index, text] of frequencies.entries()) {
    const row = filled[from + index] ?? emptyPeak(nextMode(filled));
    filled[from + index] = { ...row, frequency: readEntry(text, 'frequency', 'si') };
  }
  return filled;
}
