/**
 * Numbers as they are written and read: a value with its expanded uncertainty rounded together (JCGM 100:2008, 7.2.6), thin
 * spaces between thousands, a real minus sign; decimal comma and grouping accepted on the way in.
 */
import { type Quantity, type UnitSystem, unitOf } from './units.ts';

const thinSpace = '\u2009';
const minus = '\u2212';

/**
 * A number with a fixed count of decimals; negative decimals round to tens, hundreds …
 *
 * @param value finite; anything else gives a dash
 * @param decimals integer from −15 to 15
 * @returns digits with thin spaces between thousands and a real minus sign
 */
export function formatNumber(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return '–';
  const scale = 10 ** -decimals;
  const rounded = decimals < 0 ? Math.round(value / scale) * scale : value;
  const [whole = '0', fraction] = Math.abs(rounded).toFixed(Math.max(0, decimals)).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, thinSpace);
  const digits = fraction === undefined ? grouped : `${grouped}.${fraction}`;
  return value < 0 && /[1-9]/.test(digits) ? `${minus}${digits}` : digits;
}

/**
 * Decimals that give an uncertainty two significant figures.
 *
 * @param uncertainty > 0
 * @returns decimals, below zero for tens and hundreds
 * Source: JCGM 100:2008, 7.2.6.
 */
export function decimalsOfUncertainty(uncertainty: number): number {
  // toExponential rounds 9.96 up to 1.0e1 and so keeps its two figures.
  return 1 - Number(uncertainty.toExponential(1).split('e')[1]);
}

/** A value and its expanded uncertainty, rounded to the same place. */
export interface RoundedQuantity {
  value: string;
  uncertainty: string;
  symbol: string;
  /** "3 456 ± 21 kN" */
  text: string;
}

/**
 * A value with its expanded uncertainty as the product prints it: U to two significant figures, the value to the same place.
 *
 * @param value SI
 * @param expandedUncertainty SI, >= 0; at 0 three decimals are shown
 * @param quantity what it is
 * @param system units to show it in
 * @returns both numbers, the unit and the whole text
 * Source: JCGM 100:2008, 7.2.6.
 */
export function formatWithUncertainty(value: number, expandedUncertainty: number, quantity: Quantity, system: UnitSystem): RoundedQuantity {
  const { symbol, factor, offset } = unitOf(quantity, system);
  const shown = (value - offset) / factor;
  const spread = expandedUncertainty / factor;
  const decimals = spread > 0 && Number.isFinite(spread) ? decimalsOfUncertainty(spread) : 3;
  const [valueText, uncertaintyText] = [formatNumber(shown, decimals), formatNumber(spread, decimals)];
  return { value: valueText, uncertainty: uncertaintyText, symbol, text: `${valueText} ± ${uncertaintyText} ${symbol}` };
}

/**
 * Both ends of an interval to the place that its width allows: half the width to two significant figures.
 *
 * @param interval SI, ascending
 * @returns both ends as text, and the unit
 * Source: JCGM 100:2008, 7.2.6.
 */
export function formatInterval(
  interval: readonly [number, number],
  quantity: Quantity,
  system: UnitSystem,
): { low: string; high: string; symbol: string } {
  const { symbol, factor, offset } = unitOf(quantity, system);
  const half = (interval[1] - interval[0]) / 2 / factor;
  const decimals = half > 0 && Number.isFinite(half) ? decimalsOfUncertainty(half) : 3;
  const [low, high] = interval.map((value) => formatNumber((value - offset) / factor, decimals)) as [string, string];
  return { low, high, symbol };
}

/** What reading a typed number gives. */
export type ParsedNumber = { ok: true; value: number } | { ok: false; code: 'empty' | 'not-a-number' | 'ambiguous'; message: string };

/**
 * Reads a number as people type it: decimal point or comma, thousands grouped by spaces, thin spaces or apostrophes, a real
 * minus sign. A lone comma is a decimal comma; where point and comma both occur, the last one is the decimal mark.
 *
 * @param text as typed
 * @returns the value, or why it is none
 */
export function parseNumber(text: string): ParsedNumber {
  const compact = text.replace(/[\s\u00A0\u2009\u202F'’]/g, '').replace(/[\u2212\u2013]/g, '-');
  if (compact === '') return { ok: false, code: 'empty', message: 'Enter a number.' };
  const nonsense: ParsedNumber = {
    ok: false,
    code: 'not-a-number',
    message: `“${text.trim()}” is not a number; write for example 12.5 or 12,5.`,
  };
  if (!/^[+-]?[\d.,]*\d[\d.,]*(e[+-]?\d+)?$/i.test(compact)) return nonsense;
  const plain = withDecimalPoint(compact);
  if (plain === null) {
    return { ok: false, code: 'ambiguous', message: `“${text.trim()}” can be read in two ways; write one decimal mark and no grouping.` };
  }
  const value = Number(plain);
  return Number.isFinite(value) ? { ok: true, value } : nonsense;
}

function withDecimalPoint(text: string): string | null {
  const [points, commas] = [text.split('.').length - 1, text.split(',').length - 1];
  if (commas === 0) return points <= 1 ? text : ungrouped(text, '.');
  if (points === 0) return commas === 1 ? text.replace(',', '.') : ungrouped(text, ',');
  // "1,234.5" and "1.234,5": the mark that comes last divides, the other groups thousands in threes.
  const [decimal, group] = text.lastIndexOf(',') > text.lastIndexOf('.') ? [',', '.'] : ['.', ','];
  const [whole, fraction, ...more] = text.split(decimal);
  if (more.length > 0 || fraction === undefined) return null;
  const joined = ungrouped(whole!, group!);
  return joined === null ? null : `${joined}.${fraction}`;
}

/** "1.234.567" → "1234567"; null unless every group has three digits. */
function ungrouped(text: string, mark: string): string | null {
  const [first, ...groups] = text.split(mark);
  return /^[+-]?\d{1,3}$/.test(first!) && groups.every((group) => /^\d{3}$/.test(group)) ? `${first}${groups.join('')}` : null;
}
