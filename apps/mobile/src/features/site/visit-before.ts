import type { ChecklistRow } from './checklist-rows.ts';

/** The cable that was visited last before this one, whose answers may hold here too. */
export function latestOther(rows: readonly ChecklistRow[], row: ChecklistRow): ChecklistRow | null {
  const visited = rows.filter(({ key, measurement }) => key !== row.key && measurement !== null);
  return visited.toSorted((a, b) => Date.parse(b.measurement!.visitedAt) - Date.parse(a.measurement!.visitedAt))[0] ?? null;
}
