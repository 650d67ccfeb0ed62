import { formatNumber } from '@strandnote/core/units';
import { showTension } from '../../lib/show-tension.ts';
import { showDay } from '../../lib/show-time.ts';
import type { Units } from '../../lib/units.tsx';
import type { ResultRow } from './result-rows.ts';

/** "3 520 ± 110", the two rounded together; the interval alone where only bounds are given. */
export function tensionWords(row: ResultRow, units: Units): string {
  const output = row.span.estimate?.output;
  if (!output) return '–';
  if (row.zone === 'bounds-only') return output.interval95.map((bound) => units.figure(bound, 'force')).join(' to ');
  return showTension(output, units);
}

export function percentWords(share: number | null): string {
  if (share === null) return '–';
  return `${share > 0 ? '+' : ''}${formatNumber(100 * share, 1)} %`;
}

/** The tension of the last survey with its temperature: a difference is left to the joint fit of both campaigns. */
export function changeWords(row: ResultRow, units: Units): string {
  const last = row.span.lastSurvey;
  if (!last) return '–';
  const temperature = last.steelTemperature === null ? '' : `, ${units.show(last.steelTemperature, 'temperature')}`;
  return `${units.figure(last.tension, 'force')} (${showDay(last.startsOn)}${temperature})`;
}
