import { readNumber } from '../../lib/read-number.ts';

/**
 * The frequencies in what was copied from a spreadsheet: one a line. Where a line has several cells, the last that is a number
 * counts, so that a column of mode numbers before it does no harm. Heads and empty lines are passed over.
 *
 * @returns the texts as they stood, or null for a single value, which belongs to the field alone
 */
export function pastedColumn(text: string): string[] | null {
  const lines = text.split(/\r?\n/).map((line) => line.trim());
  const cells = lines.map((line) =>
    line
      .split(/\t|;|\s{2,}/)
      .map((cell) => cell.replace(/\s*Hz\s*$/i, '').trim())
      .findLast((cell) => readNumber(cell) !== null),
  );
  const numbers = cells.filter((cell) => cell !== undefined);
  return numbers.length > 1 ? numbers : null;
}
