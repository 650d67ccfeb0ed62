import { expect, test } from 'vitest';
import {
  emptyOutbox,
  type NewEntry,
  nextEntry,
  type OutboxAction,
  type OutboxState,
  reduceOutbox,
  statusOf,
} from '../../apps/mobile/src/lib/outbox-state.ts';

function entry(id: string, key: string, body: unknown = {}, userId = 'engineer'): NewEntry {
  return { id, userId, key, method: 'PUT', path: `/x/${key}`, body, subject: key, refreshes: [], queuedAt: '2026-05-04T08:00:00Z' };
}

function after(...actions: OutboxAction[]): OutboxState {
  return actions.reduce(reduceOutbox, emptyOutbox);
}

const queue = (id: string, key: string, body?: unknown, userId?: string): OutboxAction => ({
  type: 'entryQueued',
  entry: entry(id, key, body, userId),
});
const sent = (id: string, version: number | null = null): OutboxAction => ({ type: 'entrySent', id, at: '2026-05-04T09:00:00Z', version });

test('entries are sent in the order in which they were entered', () => {
  const state = after(queue('1', 'a'), queue('2', 'b'), queue('3', 'c'));
  const order: string[] = [];
  const tried = new Set<string>();
  for (let next = nextEntry(state, 'engineer', tried); next; next = nextEntry(state, 'engineer', tried)) {
    order.push(next.id);
    tried.add(next.id);
  }
  expect(order).toEqual(['1', '2', '3']);
});

test('a later entry about the same thing replaces one that still waits, in its place', () => {
  const state = after(queue('1', 'a', { peaks: 1 }), queue('2', 'b'), queue('3', 'a', { peaks: 2 }));
  expect(state.entries.map(({ id }) => id)).toEqual(['3', '2']);
  expect(state.entries[0]!.body).toEqual({ peaks: 2 });
});

test('an entry that is on its way is not replaced: the later one follows it', () => {
  const state = after(queue('1', 'a'), { type: 'sendingStarted', id: '1' }, queue('2', 'a'));
  expect(state.entries.map(({ id, state: at }) => [id, at])).toEqual([
    ['1', 'sending'],
    ['2', 'waiting'],
  ]);
});

test('an entry that follows its forerunner carries the version that the server gave to it', () => {
  const state = after(queue('1', 'a', { version: 0 }), { type: 'sendingStarted', id: '1' }, queue('2', 'a', { version: 0 }), sent('1', 1));
  expect(state.entries).toHaveLength(1);
  expect(state.entries[0]!.body).toEqual({ version: 1 });
});

test('an entry from a screen that has not heard of the new version yet is brought up to it, and never down', () => {
  const known = after(queue('1', 'a', { version: 0 }), sent('1', 4));
  expect(reduceOutbox(known, queue('2', 'a', { version: 3 })).entries[0]!.body).toEqual({ version: 4 });
  expect(reduceOutbox(known, queue('2', 'a', { version: 6 })).entries[0]!.body).toEqual({ version: 6 });
  expect(reduceOutbox(known, queue('2', 'b', { version: 3 })).entries[0]!.body).toEqual({ version: 3 });
});

test('a connection that fails loses nothing: the entry waits again', () => {
  const state = after(queue('1', 'a', { peaks: 1 }), { type: 'sendingStarted', id: '1' }, { type: 'sendingFailed', id: '1' });
  expect(state.entries[0]).toMatchObject({ state: 'waiting', attempts: 1, body: { peaks: 1 } });
});

test('an app that was closed while sending sends again', () => {
  const state = after(queue('1', 'a'), { type: 'sendingStarted', id: '1' }, { type: 'appRestarted' });
  expect(nextEntry(state, 'engineer', new Set())?.id).toBe('1');
});

test('a refused entry stays with its reason, stops nothing behind it, and can be sent again or discarded', () => {
  const refused = after(queue('1', 'a'), queue('2', 'b'), {
    type: 'entryRefused',
    id: '1',
    code: 'changed-elsewhere',
    message: 'Changed by another.',
  });
  expect(statusOf(refused, 'a')).toEqual({ kind: 'refused', reason: 'Changed by another.', code: 'changed-elsewhere', id: '1' });
  expect(nextEntry(refused, 'engineer', new Set())?.id).toBe('2');
  expect(statusOf(reduceOutbox(refused, { type: 'refusalRetried', id: '1' }), 'a')).toEqual({ kind: 'on this phone' });
  expect(statusOf(reduceOutbox(refused, { type: 'refusalDiscarded', id: '1' }), 'a')).toBeNull();
});

test('only a refusal can be discarded, never what still waits', () => {
  const state = after(queue('1', 'a'));
  expect(reduceOutbox(state, { type: 'refusalDiscarded', id: '1' }).entries).toHaveLength(1);
});

test('what one person entered is not sent under the session of another, nor replaced by it', () => {
  const state = after(queue('1', 'a', {}, 'engineer'), queue('2', 'a', {}, 'colleague'));
  expect(state.entries).toHaveLength(2);
  expect(nextEntry(state, 'colleague', new Set())?.id).toBe('2');
  expect(nextEntry(state, 'checker', new Set())).toBeNull();
});

test('the status of a thing is that of the last entry about it', () => {
  expect(statusOf(emptyOutbox, 'a')).toBeNull();
  const done = after(queue('1', 'a'), sent('1'));
  expect(statusOf(done, 'a')).toEqual({ kind: 'sent', at: '2026-05-04T09:00:00Z' });
  expect(statusOf(reduceOutbox(done, queue('2', 'a')), 'a')).toEqual({ kind: 'on this phone' });
});

test('news of an entry that is gone changes nothing', () => {
  const state = after(queue('1', 'a'));
  expect(reduceOutbox(state, sent('9', 3))).toEqual(state);
});
