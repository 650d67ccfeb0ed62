import type { ChecklistRow } from './checklist-rows.ts';

/** The address of a span's entry; a cable of one span needs no more than its own name. */
export function entryHref(listHref: string, { entry, span }: ChecklistRow): string {
  const { id, spans } = entry.cable;
  return `${listHref}/${id}${spans.length > 1 ? `?span=${span.id}` : ''}`;
}
