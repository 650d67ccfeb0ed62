/** "2026-12-01 10:40", as a clock at the structure shows it. */
export function instantText(iso: string, timeZone: string): string {
  const part = partsIn(new Date(iso), timeZone);
  return `${part.year}-${part.month}-${part.day} ${part.hour}:${part.minute}`;
}

/** The instant that a clock at the structure showed so; null for what is no date and time. Accepts 1.12.2026 and 10.40 too. */
export function readInstant(text: string, timeZone: string): string | null {
  const match =
    /^\s*(\d{4})-(\d{1,2})-(\d{1,2})[ T,]+(\d{1,2})[:.](\d{2})\s*$/.exec(text) ??
    reordered(/^\s*(\d{1,2})\.(\d{1,2})\.(\d{4})[ ,]+(\d{1,2})[:.](\d{2})\s*$/.exec(text));
  if (!match) return null;
  const [year, month, day, hour, minute] = match.slice(1, 6).map(Number) as [number, number, number, number, number];
  const asUtc = Date.UTC(year, month - 1, day, hour, minute);
  const there = new Date(asUtc);
  if (there.getUTCMonth() !== month - 1 || there.getUTCDate() !== day || hour > 23 || minute > 59) return null;
  // Twice, since the first guess may lie on the other side of a change of the clocks.
  const guess = asUtc - offsetAt(asUtc, timeZone);
  return new Date(asUtc - offsetAt(guess, timeZone)).toISOString();
}

function reordered(match: RegExpExecArray | null): string[] | null {
  if (!match) return null;
  const [whole, day, month, year, hour, minute] = match;
  return [whole!, year!, month!, day!, hour!, minute!];
}

/** How far a clock there is ahead of UTC (ms). */
function offsetAt(instant: number, timeZone: string): number {
  const part = partsIn(new Date(instant), timeZone);
  return Date.UTC(+part.year!, +part.month! - 1, +part.day!, +part.hour!, +part.minute!) - Math.floor(instant / 60_000) * 60_000;
}

function partsIn(date: Date, timeZone: string): Record<string, string> {
  const parts = new Intl.DateTimeFormat('en-GB', {
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZone,
  }).formatToParts(date);
  return Object.fromEntries(parts.map(({ type, value }) => [type, value]));
}
