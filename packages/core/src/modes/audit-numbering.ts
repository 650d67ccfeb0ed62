/**
 * Even typed mode numbers are audited: the same frequencies are numbered afresh and what was typed is held against the result.
 */
import type { ModalPeak } from '../cable/cable.ts';
import type { EstimateNote } from '../fit/tension-estimate.ts';
import { type ModeNumbering, type NumberingOptions, numberModes } from './number-modes.ts';

/** What the audit of typed numbers says. */
export interface NumberingAudit {
  notes: EstimateNote[];
  /** Ranked numberings of the same peaks, in their order. */
  alternatives: ModeNumbering[];
  /** Place of the typed numbering among them, 0 the best; null when it is not among them. */
  typedRank: number | null;
}

/** Odds from which an alternative is worth a warning. */
const tellingOdds = 5;

/**
 * Holds typed mode numbers against those that the frequencies suggest.
 *
 * @param peaks numbered frequencies (Hz) of one plane
 * @param options cable, expected tension, quality of the frequencies
 * @returns notes in plain sentences, the ranked alternatives and the place of what was typed
 * @throws EstimationError as {@link numberModes}
 * Source: the product's own.
 */
export function auditNumbering(peaks: readonly ModalPeak[], options: NumberingOptions = {}): NumberingAudit {
  const frequencies = peaks.map(({ frequency }) => frequency);
  const alternatives = numberModes(frequencies, options);
  const typed = peaks.map(({ mode }) => mode);
  const rank = alternatives.findIndex(({ modes }) => modes.every((mode, i) => mode === typed[i]));
  const notes = [...shapeNotes(typed), ...rivalNotes(typed, alternatives, rank), ...priorNotes(frequencies, alternatives, options)];
  return { notes, alternatives, typedRank: rank < 0 ? null : rank };
}

function shapeNotes(typed: readonly number[]): EstimateNote[] {
  if (typed.length === 1) {
    return [
      {
        code: 'lone-peak',
        severity: 'serious',
        field: 'peaks',
        message: 'A lone peak can carry any number: its tension is a guess until a second mode confirms the order.',
      },
    ];
  }
  if (typed.length === 0 || typed.some((mode) => mode % 2 === 1)) return [];
  return [
    {
      code: 'even-modes-only',
      severity: 'serious',
      field: 'peaks',
      message:
        'Only even numbers are given. The same frequencies numbered 1, 2, 3 … belong to a cable of four times the tension; nothing in them tells the two apart.',
    },
  ];
}

function rivalNotes(typed: readonly number[], alternatives: readonly ModeNumbering[], rank: number): EstimateNote[] {
  const winner = alternatives[0];
  if (!winner || rank === 0 || typed.length < 2) return [];
  const own = rank < 0 ? 0 : alternatives[rank]!.probability;
  if (own > 0 && winner.probability / own < tellingOdds) return [];
  const differing = typed.flatMap((mode, i) => (winner.modes[i] === mode ? [] : [`${mode} → ${winner.modes[i] ?? 'foreign'}`]));
  return [
    {
      code: 'numbering-doubtful',
      severity: 'serious',
      field: 'peaks',
      message: `Another numbering fits much better: ${differing.join(', ')}. Check the order of these peaks.`,
    },
  ];
}

/** What the expected tension decides must be said: without it the frequencies mean something else. */
function priorNotes(frequencies: readonly number[], alternatives: readonly ModeNumbering[], options: NumberingOptions): EstimateNote[] {
  const winner = alternatives[0];
  if (!options.tension || !winner) return [];
  const { tension: _tension, ...without } = options;
  const free = numberModes(frequencies, without)[0];
  if (!free || Math.abs(Math.log(free.fundamental / winner.fundamental)) < 0.015) return [];
  return [
    {
      code: 'numbering-rests-on-expected-tension',
      severity: 'caution',
      field: 'peaks',
      message: 'The expected tension decides this numbering: the frequencies alone would be numbered otherwise.',
    },
  ];
}
