/** A calendar day as the form shows it; empty where there is none. */
export function dayText(day: string | null): string {
  return day ?? '';
}

/** Reads "2026-12-01" or "1.12.2026"; null for an empty field and for what is no day. */
export function readDay(text: string): string | null {
  const iso = /^\s*(\d{4})-(\d{1,2})-(\d{1,2})\s*$/.exec(text);
  const dotted = /^\s*(\d{1,2})\.(\d{1,2})\.(\d{4})\s*$/.exec(text);
  const parts = iso ? [iso[1], iso[2], iso[3]] : dotted ? [dotted[3], dotted[2], dotted[1]] : null;
  if (!parts) return null;
  const [year, month, day] = parts.map(Number) as [number, number, number];
  const date = new Date(Date.UTC(year, month - 1, day));
  if (date.getUTCMonth() !== month - 1 || date.getUTCDate() !== day) return null;
  return date.toISOString().slice(0, 10);
}

/** What is wrong with a typed day; null when nothing is. */
export function problemOfDay(text: string, { name, required }: { name: string; required?: boolean }): string | null {
  if (text.trim() === '') return required ? `${name} is missing.` : null;
  return readDay(text) === null ? `“${text.trim()}” is no date. Write it as 2026-12-01.` : null;
}
