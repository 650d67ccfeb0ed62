import { isDeepStrictEqual } from 'node:util';

/**
 * Whether a stored row already holds everything that was sent: a request sent twice changes nothing the second time.
 * What was not sent is not compared.
 */
export function isSameEntry(stored: Record<string, unknown>, sent: Record<string, unknown>): boolean {
  return Object.keys(changesOf(stored, sent).to).length === 0;
}

/** The fields that differ, as they were and as they are wanted: what an audit event tells of a change. */
export function changesOf(stored: Record<string, unknown>, sent: Record<string, unknown>) {
  const names = Object.keys(sent).filter((name) => sent[name] !== undefined && !isDeepStrictEqual(stored[name], sent[name]));
  const pick = (row: Record<string, unknown>) => Object.fromEntries(names.map((name) => [name, row[name]]));
  return { from: pick(stored), to: pick(sent) };
}
