/** Dates as the report writes them. Days come without a time zone; moments are told in the structure's. */

/** "1 September 2026", from 2026-09-01. */
export function day(isoDay: string): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' }).format(new Date(`${isoDay.slice(0, 10)}T00:00:00Z`));
}

/** "1 to 3 September 2026" */
export function days(from: string, to: string | null): string {
  if (to === null || to === from) return day(from);
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' })
    .formatRange(new Date(`${from}T00:00:00Z`), new Date(`${to}T00:00:00Z`))
    .replace(/\s*[–-]\s*/, ' to ');
}

/** "1 September 2026, 08:30 GMT+1" */
export function moment(at: string | Date, timeZone: string): string {
  const date = new Date(at);
  const options = { year: 'numeric', month: 'long', day: 'numeric' } as const;
  const dayText = new Intl.DateTimeFormat('en-GB', { ...options, timeZone }).format(date);
  const parts = new Intl.DateTimeFormat('en-GB', {
    hour: '2-digit',
    minute: '2-digit',
    timeZone,
    timeZoneName: 'shortOffset',
  }).formatToParts(date);
  const part = (type: string) => parts.find((candidate) => candidate.type === type)?.value ?? '';
  return `${dayText}, ${part('hour')}:${part('minute')} ${part('timeZoneName')}`;
}
