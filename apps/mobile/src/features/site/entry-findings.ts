import type { ModalPeak, Section, Span } from '@strandnote/api/contract';
import { type EstimateNote, freeLength, massPerLength, type PlausibilityQuestion, questionPlausibility } from '@strandnote/core';
import { checkEntry, type EntryProblems, usablePeaks } from './check-entry.ts';
import { type EntryDraft, isBlank, modeOf, type PeakDraft } from './entry-draft.ts';
import { estimateSpan, fitOrder, type Outcome } from './live-estimate.ts';
import type { ShowQuantity } from './show-quantity.ts';

/** Everything that is said of a draft while it is typed. */
export interface EntryFindings {
  problems: EntryProblems;
  peaks: ModalPeak[];
  /** null while there is nothing to fit. */
  outcome: Outcome | null;
  /** Measured over fitted, minus one, by row. */
  residuals: Map<string, number>;
  /** What looks mistyped, by row: asked, not refused. */
  questions: Map<string, string>;
  notes: Pick<EstimateNote, 'severity' | 'message'>[];
}

interface Surroundings {
  section: Section;
  span: Span;
  timeZone: string;
  show: ShowQuantity;
}

export function findingsOf(draft: EntryDraft, { section, span, timeZone, show }: Surroundings): EntryFindings {
  const problems = checkEntry(draft, { span, timeZone });
  const peaks = fitOrder(usablePeaks(draft, problems.peaks));
  const { lowerDamper, upperDamper, crossTied } = draft.visit;
  const visit = {
    lowerDamperState: lowerDamper ?? 'none',
    upperDamperState: upperDamper ?? 'none',
    crossTied: crossTied === 'yes',
  } as const;
  const started = performance.now();
  const outcome = peaks.length === 0 ? null : estimateSpan(section, span, visit, peaks);
  // Read by whoever measures how long a keystroke waits for the tension.
  if (outcome) performance.measure('strandnote.estimate', { start: started, end: performance.now() });
  const questions = questionsOf(draft, section, span, show);
  const fitNotes = outcome?.output?.warnings ?? [];
  return {
    problems: withProblemOfFit(problems, outcome),
    peaks,
    outcome,
    residuals: residualsOf(peaks, outcome),
    questions: questions.byRow,
    notes: [
      ...leftOut(draft, peaks),
      ...fitNotes.map(({ severity, message }) => ({ severity, message })),
      ...questions.general,
      ...(outcome ? unanswered(draft, span) : []),
    ],
  };
}

function residualsOf(peaks: readonly ModalPeak[], outcome: Outcome | null): Map<string, number> {
  const residuals = outcome?.output?.residuals ?? [];
  return new Map(
    peaks.flatMap((peak) => {
      const found = residuals.find(({ mode, plane }) => mode === peak.mode && plane === peak.plane);
      return found ? [[peak.id, found.relative] as const] : [];
    }),
  );
}

/** A damper that acts without a known place, or a tie to another cable, is said beside the answer that brought it up. */
function withProblemOfFit(problems: EntryProblems, outcome: Outcome | null): EntryProblems {
  const fields = { lowerDamperState: 'lowerDamper', upperDamperState: 'upperDamper' } as const;
  const field = outcome?.problem?.field;
  if (field !== 'lowerDamperState' && field !== 'upperDamperState') return problems;
  return { ...problems, visit: { [fields[field]]: outcome!.problem!.message, ...problems.visit } };
}

/** The tension speaks for fewer peaks than were typed: said, so that nobody takes it for the whole. */
function leftOut(draft: EntryDraft, peaks: readonly ModalPeak[]): EntryFindings['notes'] {
  const inFit = new Set(peaks.map(({ id }) => id));
  const out = draft.peaks.filter((peak) => peak.used && !isBlank(peak) && !inFit.has(peak.id));
  if (out.length === 0 || peaks.length === 0) return [];
  const modes = out.map((peak) => peak.mode.trim() || '?').join(', ');
  return [{ severity: 'caution', message: `Computed without ${out.length === 1 ? 'mode' : 'modes'} ${modes}.` }];
}

function unanswered({ visit }: EntryDraft, span: Span): EntryFindings['notes'] {
  const open = [
    visit.lowerDamper === null && span.lowerDamper === 'fitted' ? 'lower' : '',
    visit.upperDamper === null && span.upperDamper === 'fitted' ? 'upper' : '',
  ].filter(Boolean);
  if (open.length === 0) return [];
  return [
    {
      severity: 'caution',
      message: `A damper is fitted at the ${open.join(' and the ')} end. Until you say what it does, the tension is computed as if it did not act.`,
    },
  ];
}

function questionsOf(draft: EntryDraft, section: Section, span: Span, show: ShowQuantity) {
  const rows = draft.peaks.filter((peak) => peak.used && peak.frequency.si !== null && modeOf(peak) !== null);
  const cable = {
    length: freeLength(span).length,
    massPerLength: massPerLength(section).value,
    bendingStiffnessBounds: [section.bendingStiffnessLow, section.bendingStiffnessHigh] as [number, number],
  };
  const byRow = new Map<string, string>();
  const general: EntryFindings['notes'] = [];
  const asked = questionPlausibility(
    cable,
    rows.map((row) => ({ mode: modeOf(row)!, frequency: row.frequency.si! })),
  );
  for (const question of asked) {
    const row = rowOf(question, rows);
    if (row) byRow.set(row.id, question.message);
    else general.push({ severity: 'caution', message: inUnits(question, cable, show) });
  }
  return { byRow, general };
}

function rowOf({ field }: PlausibilityQuestion, rows: readonly PeakDraft[]): PeakDraft | undefined {
  const index = /^peaks\[(\d+)\]/.exec(field)?.[1];
  return index === undefined ? undefined : rows[Number(index)];
}

/** The core speaks SI; the person reads their own units. */
function inUnits({ code, message }: PlausibilityQuestion, cable: { length: number; massPerLength: number }, show: ShowQuantity): string {
  if (code === 'length-looks-like-mm' || code === 'length-unusual') {
    const length = show(cable.length, 'length', 1);
    return `The free length in the registry is ${length}, which is ${cable.length > 1 ? 'longer than any stay' : 'very short'}. Was it typed in another unit?`;
  }
  if (code === 'mass-unusual') {
    return `The mass in the registry is ${show(cable.massPerLength, 'mass-per-length')}, which cables do not have. Was it typed in another unit?`;
  }
  return message;
}
