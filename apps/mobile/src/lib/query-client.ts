import { createAsyncStoragePersister } from '@tanstack/query-async-storage-persister';
import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { del, get, set } from 'idb-keyval';
import { ApiProblem } from './api-problem.ts';

export const meKey = ['me'] as const;

/** A cached reply is kept for a month: a campaign is loaded in the office and worked on without a signal. */
const keptFor = 30 * 24 * 60 * 60 * 1000;
const storageKey = 'strandnote.queries';

// A session that ended shows itself in any reply; the layouts then ask to sign in, and what was typed stays in the outbox.
function noticeEndOfSession(error: unknown): void {
  if (error instanceof ApiProblem && error.kind === 'signed-out') queryClient.setQueryData(meKey, null);
}

export const queryClient: QueryClient = new QueryClient({
  queryCache: new QueryCache({ onError: noticeEndOfSession }),
  mutationCache: new MutationCache({ onError: noticeEndOfSession }),
  defaultOptions: {
    queries: {
      networkMode: 'offlineFirst',
      gcTime: keptFor,
      staleTime: 10_000,
      // Only what may go away by itself is worth asking again.
      retry: (failures, error) => failures < 2 && error instanceof ApiProblem && (error.kind === 'offline' || error.kind === 'failed'),
    },
    mutations: { networkMode: 'always', retry: false },
  },
});

export const persistOptions = {
  persister: createAsyncStoragePersister({
    storage: {
      getItem: async (key: string) => (await get<string>(key)) ?? null,
      setItem: (key: string, value: string) => set(key, value),
      removeItem: (key: string) => del(key),
    },
    key: storageKey,
    throttleTime: 1000,
  }),
  maxAge: keptFor,
  // Shapes of replies may change with a version: an older store is not read.
  buster: '1',
};

/** Nothing of one person is left for the next on the same device. The outbox is not touched: it is not sent yet. */
export async function forgetEverything(): Promise<void> {
  queryClient.clear();
  await del(storageKey);
}
