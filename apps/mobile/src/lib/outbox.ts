import { get, update } from 'idb-keyval';
import { exchange } from './api-client.ts';
import { ApiProblem } from './api-problem.ts';
import {
  emptyOutbox,
  type NewEntry,
  nextEntry,
  type OutboxAction,
  type OutboxEntry,
  type OutboxState,
  reduceOutbox,
} from './outbox-state.ts';
import { meKey, queryClient } from './query-client.ts';

const storageKey = 'strandnote.outbox';
/** One tab sends at a time: two would send everything twice. */
const lockName = 'strandnote.outbox';
const retryAfter = [2_000, 5_000, 15_000, 60_000];

let state: OutboxState = emptyOutbox;
let sender: string | null = null;
let sending = false;
let failures = 0;
let timer: ReturnType<typeof setTimeout> | undefined;
const listeners = new Set<() => void>();
const otherTabs = new BroadcastChannel(storageKey);

export function currentOutbox(): OutboxState {
  return state;
}

export function subscribeToOutbox(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Reads what an earlier run left behind and goes on sending whenever there is hope. Call once, when the app starts. */
export async function openOutbox(): Promise<void> {
  // Another tab's news is shown here, not acted on: two tabs that answer each other would never come to rest.
  otherTabs.onmessage = () => reread();
  addEventListener('online', () => flushOutbox());
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible') flushOutbox();
  });
  await reread();
  flushOutbox();
}

/** Resolves once the entry is safe on this device. Sending follows by itself. */
export async function queueEntry(entry: Omit<NewEntry, 'id' | 'queuedAt'>): Promise<void> {
  await dispatch({ type: 'entryQueued', entry: { ...entry, id: crypto.randomUUID(), queuedAt: new Date().toISOString() } });
  // Asked here, when there is something to lose: a browser under pressure deletes storage that nobody asked to keep.
  navigator.storage?.persist?.().catch(() => false);
  flushOutbox();
}

export async function discardRefusal(id: string): Promise<void> {
  await dispatch({ type: 'refusalDiscarded', id });
}

export async function retryRefusal(id: string): Promise<void> {
  await dispatch({ type: 'refusalRetried', id });
  flushOutbox();
}

/** Whose entries may be sent now: the person signed in, or nobody. */
export function sendAs(userId: string | null): void {
  sender = userId;
  failures = 0;
  flushOutbox();
}

/** Sends what waits, in order, unless that is under way already. */
export function flushOutbox(): void {
  clearTimeout(timer);
  if (sending || !hasWork()) return;
  sending = true;
  navigator.locks
    .request(lockName, { ifAvailable: true }, async (lock) => {
      if (lock) await sendRound();
    })
    .catch((error: unknown) => console.error(error))
    .finally(() => {
      sending = false;
      planRetry();
    });
}

async function sendRound(): Promise<void> {
  // The lock is ours: whoever was sending is gone.
  if (state.entries.some((entry) => entry.state === 'sending')) await dispatch({ type: 'appRestarted' });
  const tried = new Set<string>();
  for (;;) {
    const entry = sender === null ? null : nextEntry(state, sender, tried);
    if (!entry) return;
    tried.add(entry.id);
    await dispatch({ type: 'sendingStarted', id: entry.id });
    if (!(await sendEntry(entry.id))) return;
  }
}

/** Whether it makes sense to go on with the next one. */
async function sendEntry(id: string): Promise<boolean> {
  const entry = state.entries.find((candidate) => candidate.id === id);
  if (!entry) return true;
  try {
    const reply = await exchange(entry.method, entry.path, entry.body);
    await dispatch({ type: 'entrySent', id, at: new Date().toISOString(), version: versionOf(reply) });
    failures = 0;
    refresh(entry);
    return true;
  } catch (error) {
    return noteFailure(id, error);
  }
}

async function noteFailure(id: string, error: unknown): Promise<boolean> {
  const problem = error instanceof ApiProblem ? error : null;
  if (problem && (problem.kind === 'refused' || problem.kind === 'not-allowed' || problem.kind === 'not-found') && problem.status !== 429) {
    const details = problem.fieldErrors.map(({ message }) => message);
    const message = details.length > 0 ? details.join(' ') : problem.message;
    await dispatch({ type: 'entryRefused', id, code: problem.code, message });
    return true;
  }
  failures += 1;
  await dispatch({ type: 'sendingFailed', id });
  // Whoever shows who is signed in finds out, and `sendAs` follows.
  if (problem?.kind === 'signed-out') await queryClient.invalidateQueries({ queryKey: meKey });
  // An error of the server may be about this entry alone: the others are tried all the same.
  return problem?.kind === 'failed';
}

function refresh(entry: OutboxEntry): void {
  for (const queryKey of entry.refreshes) queryClient.invalidateQueries({ queryKey });
}

function versionOf(reply: unknown): number | null {
  if (typeof reply !== 'object' || reply === null || !('version' in reply)) return null;
  return typeof reply.version === 'number' ? reply.version : null;
}

/** Whether the person signed in has something here that may still be sent. */
function hasWork(): boolean {
  return sender !== null && state.entries.some((entry) => entry.userId === sender && entry.state !== 'refused');
}

function planRetry(): void {
  if (hasWork()) timer = setTimeout(flushOutbox, retryAfter[Math.min(failures, retryAfter.length - 1)]);
}

/** The stored queue is the truth and changes in one transaction, whichever tab changes it. */
async function dispatch(action: OutboxAction): Promise<void> {
  let next = state;
  await update<OutboxState>(storageKey, (stored) => {
    next = reduceOutbox(stored ?? emptyOutbox, action);
    return next;
  });
  publish(next);
  otherTabs.postMessage(null);
}

async function reread(): Promise<void> {
  publish((await get<OutboxState>(storageKey)) ?? emptyOutbox);
}

function publish(next: OutboxState): void {
  state = next;
  for (const listener of listeners) listener();
}
