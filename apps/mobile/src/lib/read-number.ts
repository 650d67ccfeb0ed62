/**
 * Reads a number as people type it: decimal point or decimal comma, spaces between thousands, a real minus sign.
 * A lone comma is a decimal comma; where both marks occur, the last one is the decimal mark.
 * Returns null for what is not a finite number.
 */
export function readNumber(text: string): number | null {
  const compact = text.replace(/[\s\u00A0\u2009\u202F']/g, '').replace(/[\u2212\u2013]/g, '-');
  const plain = withDecimalPoint(compact);
  if (plain === null || !/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain)) return null;
  const value = Number(plain);
  return Number.isFinite(value) ? value : null;
}

function withDecimalPoint(text: string): string | null {
  const comma = text.lastIndexOf(',');
  const point = text.lastIndexOf('.');
  if (comma === -1) return text;
  if (point === -1) return text.indexOf(',') === comma ? text.replace(',', '.') : null;
  // "1,234.5" and "1.234,5": the mark that comes last divides, the other groups thousands in threes.
  const [decimal, group] = comma > point ? [',', '.'] : ['.', ','];
  const [whole, fraction, ...more] = text.split(decimal);
  if (more.length > 0 || !/^[+-]?\d{1,3}([.,]\d{3})+$/.test(whole ?? '')) return null;
  return `${whole!.replaceAll(group!, '')}.${fraction}`;
}
