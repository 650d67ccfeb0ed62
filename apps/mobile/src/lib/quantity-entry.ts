import type { UnitSystem } from '@strandnote/api/contract';
import { formatNumber, fromSi, type Quantity, toSi, unitOf } from '@strandnote/core/units';
import { readNumber } from './read-number.ts';

/** What stands in a field: the text exactly as it was typed, and the SI value that it means, or null. */
export interface QuantityEntry {
  text: string;
  si: number | null;
}

export interface QuantityRules {
  /** As a sentence begins: "The chord". */
  name: string;
  kind: Quantity;
  required?: boolean;
  /** In SI: more than; at least; at most. */
  above?: number;
  from?: number;
  to?: number;
}

export const emptyEntry: QuantityEntry = { text: '', si: null };

export function readEntry(text: string, kind: Quantity, system: UnitSystem): QuantityEntry {
  const shown = readNumber(text);
  return { text, si: shown === null ? null : toSi(shown, kind, system) };
}

/** A stored value as a field shows it: enough digits to be the same value again, no thousands marks to edit around. */
export function enteredValue(si: number | null | undefined, kind: Quantity, system: UnitSystem): QuantityEntry {
  if (si === null || si === undefined) return emptyEntry;
  const shown = Number(fromSi(si, kind, system).toPrecision(9));
  return { text: String(shown), si };
}

/** What is wrong with an entry, in the person's units; null when nothing is. */
export function problemOfEntry(entry: QuantityEntry, rules: QuantityRules, system: UnitSystem): string | null {
  if (entry.text.trim() === '') return rules.required ? `${rules.name} is missing.` : null;
  if (entry.si === null) return `\u201C${entry.text.trim()}\u201D is not a number. Type digits, such as 12.5 or 12,5.`;
  const bound = (si: number) => withUnit(si, rules.kind, system);
  if (rules.above !== undefined && !(entry.si > rules.above)) return `${rules.name} must be more than ${bound(rules.above)}.`;
  if (rules.from !== undefined && entry.si < rules.from) return `${rules.name} must be ${bound(rules.from)} or more.`;
  if (rules.to !== undefined && entry.si > rules.to) return `${rules.name} must be ${bound(rules.to)} or less.`;
  return null;
}

function withUnit(si: number, kind: Quantity, system: UnitSystem): string {
  const { symbol } = unitOf(kind, system);
  const shown = fromSi(si, kind, system);
  // Bounds are round in SI and crooked elsewhere: three figures say enough.
  const rounded = Number(shown.toPrecision(3));
  const decimals = Math.max(0, (String(rounded).split('.')[1] ?? '').length);
  return `${formatNumber(rounded, decimals)}${symbol === '' ? '' : ` ${symbol}`}`;
}
