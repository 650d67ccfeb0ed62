import { isMeasured, type Report, type ResultRow } from './report-input.ts';
import { setTable } from './table.ts';
import { styles } from './text-layout.ts';

export function hasUnmeasured({ rows }: Report): boolean {
  return rows.some((row) => !isMeasured(row));
}

/** The cables without a tension, and why. */
export function setNotMeasured({ sheet, rows }: Report): void {
  setTable(sheet, {
    rows: rows.filter((row) => !isMeasured(row)),
    columns: [
      { head: 'Cable', width: 70, style: { ...styles.figure, face: 'figures-strong' }, cell: ({ name }) => name },
      { head: 'Owner’s reference', width: 92, cell: ({ cable }) => cable.ownerReference || '–' },
      { head: 'Why there is no tension', width: sheet.width - 162, cell: reasonOf },
    ],
  });
}

function reasonOf({ cable, span }: ResultRow): string {
  if (cable.notMeasuredReason) return cable.notMeasuredReason;
  const setAside = span.measurement?.peaks.filter(({ used }) => !used) ?? [];
  if (setAside.length > 0 && setAside.length === span.measurement?.peaks.length) {
    return `Visited, but every peak was set aside: ${[...new Set(setAside.map(({ setAsideReason }) => setAsideReason))].filter(Boolean).join('; ') || 'no reason given'}.`;
  }
  return span.measurement ? 'Visited, but no tension was estimated.' : span.decision.reason;
}
