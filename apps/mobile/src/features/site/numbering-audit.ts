import type { Section, Span } from '@strandnote/api/contract';
import { auditNumbering, EstimationError, freeLength, type ModeNumbering, massPerLength } from '@strandnote/core';
import { type EntryDraft, isBlank, modeOf, type PeakDraft } from './entry-draft.ts';

/** Another numbering of the same rows; null: the peak belongs to something else. */
export interface Renumbering {
  modes: Record<string, number | null>;
  /** "1 as 2, 2 as 3, 3 as foreign" */
  words: string;
  /** N; null where it cannot be said. */
  tension: number | null;
  odds: string;
}

export interface NumberingFindings {
  /** The odds for the typed numbers, in words; null when others fit as well or better. */
  fits: string | null;
  notes: string[];
  alternatives: Renumbering[];
}

interface Surroundings {
  section: Section;
  span: Span;
  /** Of the last survey or of the reference (N). */
  tension: number | null;
}

/** How well an expected tension is known when it is used to tell mode numbers apart (relative; common practice). */
const expectedWithin = 0.25;
const mostAlternatives = 2;
/** Said by the fit already. */
const saidElsewhere = ['lone-peak', 'even-modes-only'];

/** Holds the typed mode numbers against those that the frequencies suggest; null with fewer than two peaks in one plane. */
export function numberingFindings(draft: EntryDraft, { section, span, tension }: Surroundings): NumberingFindings | null {
  const rows = auditedRows(draft);
  if (rows.length < 2) return null;
  const cable = { length: freeLength(span).length, massPerLength: massPerLength(section).value };
  const options = { cable, ...(tension === null ? {} : { tension: { value: tension, relativeUncertainty: expectedWithin } }) };
  try {
    const audit = auditNumbering(
      rows.map((row) => ({ mode: modeOf(row)!, frequency: row.frequency.si! })),
      options,
    );
    const doubtful = audit.notes.some(({ code }) => code === 'numbering-doubtful');
    const best = audit.alternatives[0];
    return {
      fits: !doubtful && audit.typedRank === 0 && best ? oddsInWords(best.tensionProbability) : null,
      notes: audit.notes.filter(({ code }) => !saidElsewhere.includes(code)).map(noteWords),
      alternatives: doubtful ? renumberings(rows, audit.alternatives) : [],
    };
  } catch (error) {
    if (error instanceof EstimationError) return null;
    throw error;
  }
}

/** The other numbering itself stands on the button that takes it. */
function noteWords({ code, message }: { code: string; message: string }): string {
  return code === 'numbering-doubtful' ? 'Another numbering fits these frequencies much better. Check the order of the peaks.' : message;
}

/** The plane with more peaks; rows that cannot be read, or were set aside, say nothing. */
function auditedRows(draft: EntryDraft): PeakDraft[] {
  const readable = draft.peaks.filter((row) => row.used && !isBlank(row) && (row.frequency.si ?? 0) > 0 && (modeOf(row) ?? 0) >= 1);
  const [inPlane, outOfPlane] = (['in-plane', 'out-of-plane'] as const).map((plane) => readable.filter((row) => row.plane === plane));
  return outOfPlane!.length > inPlane!.length ? outOfPlane! : inPlane!;
}

function renumberings(rows: readonly PeakDraft[], alternatives: readonly ModeNumbering[]): Renumbering[] {
  const likely = alternatives.filter(({ probability }) => probability > 0.01).slice(0, mostAlternatives);
  return likely.flatMap(({ modes, tension, probability }) => {
    const changed = rows.flatMap((row, index) => (modes[index] === modeOf(row) ? [] : [{ row, mode: modes[index] ?? null }]));
    if (changed.length === 0) return [];
    return [
      {
        modes: Object.fromEntries(changed.map(({ row, mode }) => [row.id, mode])),
        words: changed.map(({ row, mode }) => `${modeOf(row)} as ${mode ?? 'foreign'}`).join(', '),
        tension,
        odds: oddsInWords(probability),
      },
    ];
  });
}

/** "260 : 1"; beyond a thousand nobody's survey bears a figure. */
export function oddsInWords(probability: number): string {
  const odds = probability / Math.max(1e-12, 1 - probability);
  if (odds > 1000) return 'over 1000 : 1';
  return odds >= 1 ? `${odds < 10 ? odds.toPrecision(2) : Math.round(odds)} : 1` : `1 : ${(1 / odds).toPrecision(2)}`;
}
