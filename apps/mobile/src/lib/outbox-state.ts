/**
 * The queue of what was entered and is not on the server yet, as a pure reducer.
 *
 * Every entry is an idempotent request: sent twice, it happens once. Entries with the same `key` speak about the same
 * thing, so a later one replaces an earlier one that still waits. Order is kept otherwise.
 */
export interface OutboxEntry {
  id: string;
  /** Who entered it: it is never sent under another person's session. */
  userId: string;
  /** What it is about, one per thing that is saved whole: `measurement:<id>`. */
  key: string;
  method: 'PUT' | 'POST' | 'PATCH' | 'DELETE';
  path: string;
  body: unknown;
  /** In words, for the list of what waits: "Modal peaks of W-07u". */
  subject: string;
  /** Query keys to ask again once it is on the server. */
  refreshes: (readonly unknown[])[];
  queuedAt: string;
  state: 'waiting' | 'sending' | 'refused';
  attempts: number;
  refusal: { code: string; message: string } | null;
}

export interface OutboxState {
  entries: OutboxEntry[];
  /** When the last entry of a key arrived at the server, newest last. */
  sentAt: Record<string, string>;
  /** The version of a thing that the server holds since our last entry for it. */
  versions: Record<string, number>;
}

export type NewEntry = Omit<OutboxEntry, 'state' | 'attempts' | 'refusal'>;

export type OutboxAction =
  | { type: 'entryQueued'; entry: NewEntry }
  | { type: 'sendingStarted'; id: string }
  | { type: 'entrySent'; id: string; at: string; version: number | null }
  | { type: 'entryRefused'; id: string; code: string; message: string }
  | { type: 'sendingFailed'; id: string }
  | { type: 'refusalDiscarded'; id: string }
  | { type: 'refusalRetried'; id: string }
  | { type: 'appRestarted' };

export const emptyOutbox: OutboxState = { entries: [], sentAt: {}, versions: {} };

/** Enough to show "sent" on every cable of a day's work. */
const keptSent = 1000;

export function reduceOutbox(state: OutboxState, action: OutboxAction): OutboxState {
  switch (action.type) {
    case 'entryQueued':
      return queued(state, action.entry);
    case 'sendingStarted':
      return changed(state, action.id, (entry) => ({ state: 'sending', attempts: entry.attempts + 1 }));
    case 'entrySent':
      return sent(state, action);
    case 'entryRefused':
      return changed(state, action.id, () => ({ state: 'refused', refusal: { code: action.code, message: action.message } }));
    case 'sendingFailed':
      return changed(state, action.id, () => ({ state: 'waiting' }));
    case 'refusalDiscarded':
      return { ...state, entries: state.entries.filter((entry) => !(entry.id === action.id && entry.state === 'refused')) };
    case 'refusalRetried':
      return changed(state, action.id, () => ({ state: 'waiting', refusal: null }));
    case 'appRestarted':
      // Whether an entry that was being sent arrived is unknown; sending it again is harmless.
      return { ...state, entries: state.entries.map((entry) => (entry.state === 'sending' ? { ...entry, state: 'waiting' } : entry)) };
  }
}

function queued(state: OutboxState, added: NewEntry): OutboxState {
  const entry: OutboxEntry = {
    ...added,
    body: withVersion(added.body, state.versions[added.key]),
    state: 'waiting',
    attempts: 0,
    refusal: null,
  };
  const replaced = state.entries.findIndex(
    (other) => other.key === entry.key && other.userId === entry.userId && other.state !== 'sending',
  );
  const entries = replaced === -1 ? [...state.entries, entry] : state.entries.with(replaced, entry);
  return { ...state, entries };
}

function sent(state: OutboxState, { id, at, version }: { id: string; at: string; version: number | null }): OutboxState {
  const done = state.entries.find((entry) => entry.id === id);
  if (!done) return state;
  const { [done.key]: _, ...earlier } = state.sentAt;
  const sentAt = Object.fromEntries([...Object.entries(earlier), [done.key, at] as const].slice(-keptSent));
  const versions = version === null ? state.versions : { ...state.versions, [done.key]: version };
  const entries = state.entries
    .filter((entry) => entry.id !== id)
    // Entered while its forerunner was on the way: it builds on what the server holds now.
    .map((entry) => (entry.key === done.key ? { ...entry, body: withVersion(entry.body, versions[done.key]) } : entry));
  return { entries, sentAt, versions };
}

/** A screen may still hold the version from before our own last entry arrived. */
function withVersion(body: unknown, known: number | undefined): unknown {
  if (known === undefined || typeof body !== 'object' || body === null || !('version' in body)) return body;
  return typeof body.version === 'number' && body.version < known ? { ...body, version: known } : body;
}

function changed(state: OutboxState, id: string, change: (entry: OutboxEntry) => Partial<OutboxEntry>): OutboxState {
  return { ...state, entries: state.entries.map((entry) => (entry.id === id ? { ...entry, ...change(entry) } : entry)) };
}

/** The next entry to send for a person: the oldest that waits and was not tried in this round. */
export function nextEntry(state: OutboxState, userId: string, tried: ReadonlySet<string>): OutboxEntry | null {
  return state.entries.find((entry) => entry.state === 'waiting' && entry.userId === userId && !tried.has(entry.id)) ?? null;
}

export type OutboxStatus =
  | { kind: 'on this phone' }
  | { kind: 'sent'; at: string }
  | { kind: 'refused'; reason: string; id: string; code: string };

/** Where the last entry of a key is; null when nothing was entered here. */
export function statusOf(state: OutboxState, key: string): OutboxStatus | null {
  const entry = state.entries.findLast((candidate) => candidate.key === key);
  if (entry?.refusal && entry.state === 'refused')
    return { kind: 'refused', reason: entry.refusal.message, code: entry.refusal.code, id: entry.id };
  if (entry) return { kind: 'on this phone' };
  const at = state.sentAt[key];
  return at === undefined ? null : { kind: 'sent', at };
}
