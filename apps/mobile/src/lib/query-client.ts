import { createAsyncStoragePersister } from '@tanstack/query-async-storage-persister';
import { defaultShouldDehydrateQuery, MutationCache, type Query, QueryCache, QueryClient } from '@tanstack/react-query';
import { del, get, set } from 'idb-keyval';
import { ApiProblem } from './api-problem.ts';

export const meKey = ['me'] as const;

/**
 * How long a cached reply is kept (ms): a campaign is loaded in the office and worked on without a signal.
 * Timers of browsers hold 2^31 ms, 24.8 days; a longer one fires at once and would empty the cache.
 */
const keptFor = 24 * 24 * 60 * 60 * 1000;
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
      // Without a connection a query goes on asking and keeps showing what it has; an error would take that off the screen.
      retry: (failures, error) => error instanceof ApiProblem && (error.kind === 'offline' || (error.kind === 'failed' && failures < 2)),
      retryDelay: (attempt) => Math.min(1000 * 2 ** attempt, 15_000),
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
  dehydrateOptions: {
    // What nobody has asked for in all that time is not carried from one run of the app to the next for ever.
    shouldDehydrateQuery: (query: Query) => defaultShouldDehydrateQuery(query) && Date.now() - query.state.dataUpdatedAt < keptFor,
  },
  // Shapes of replies may change with a version: an older store is not read.
  buster: '1',
};

/** Nothing of one person is left for the next on the same device. The outbox is not touched: it is not sent yet. */
export async function forgetEverything(): Promise<void> {
  // Not `clear`: whoever watches who is signed in would go on watching a query that is no longer in the cache.
  queryClient.removeQueries({ predicate: (query) => query.queryKey[0] !== meKey[0] });
  await del(storageKey);
}
