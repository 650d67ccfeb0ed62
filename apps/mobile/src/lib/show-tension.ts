import { formatWithUncertainty } from '@strandnote/core';
import type { Units } from './units.tsx';

/** "3 520 ± 110": a tension with its expanded uncertainty, rounded together, in the reader's unit of force. */
export function showTension({ tension, expanded }: { tension: number; expanded: { U: number } }, units: Units): string {
  const { value, uncertainty } = formatWithUncertainty(tension, expanded.U, 'force', units.system);
  return `${value} ± ${uncertainty}`;
}
