import { createHash } from 'node:crypto';

/**
 * JSON text of a value that does not depend on the order in which its properties were written.
 *
 * Names are sorted by UTF-16 code units and numbers are written as ECMAScript writes them (the scheme of RFC 8785), so
 * that a value which has been through the database and back has the same text and the same hash. Properties that are
 * undefined are left out.
 *
 * @throws RangeError for a number that JSON cannot carry
 */
export function canonicalJson(value: unknown): string {
  if (typeof value === 'number' && !Number.isFinite(value)) throw new RangeError('JSON carries finite numbers only.');
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`;
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, member]) => `${JSON.stringify(name)}:${canonicalJson(member)}`);
  return `{${members.join(',')}}`;
}

/** SHA-256 of a text in UTF-8, as 64 hexadecimal digits. */
export function sha256OfText(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

/** SHA-256 of a value's canonical JSON. */
export function sha256OfJson(value: unknown): string {
  return sha256OfText(canonicalJson(value));
}
