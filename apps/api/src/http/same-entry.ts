import { isDeepStrictEqual } from 'node:util';

/**
 * Whether a stored row already holds everything that was sent: a request sent twice changes nothing the second time.
 * What was not sent is not compared.
 */
export function isSameEntry(stored: Record<string, unknown>, sent: Record<string, unknown>): boolean {
  return Object.entries(sent).every(([name, value]) => value === undefined || isDeepStrictEqual(stored[name], value));
}
