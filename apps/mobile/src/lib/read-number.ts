import { parseNumber } from '@strandnote/core/units';

/** A number as people type it, with decimal point or comma; null for what is not one, or could be read in two ways. */
export function readNumber(text: string): number | null {
  const parsed = parseNumber(text);
  return parsed.ok ? parsed.value : null;
}
