import { PersistQueryClientProvider } from '@tanstack/react-query-persist-client';
import { Slot } from 'expo-router';
import { Suspense, useEffect } from 'react';
import { config } from 'zod';
import { openOutbox, sendAs } from '../../lib/outbox.ts';
import { persistOptions, queryClient } from '../../lib/query-client.ts';
import { registerServiceWorker } from '../../lib/service-worker.ts';
import { useMeQuery } from '../../lib/session.tsx';
import { useThemeFonts } from '../../theme/theme-fonts.ts';
import { ThemeProvider } from '../../theme/use-theme.tsx';
import { Loading } from '../../ui/index.ts';
import { UpdatePrompt } from './update-prompt.tsx';

// Left to itself zod tries whether it may compile with eval, which the Content Security Policy forbids and reports.
config({ jitless: true });
registerServiceWorker();
openOutbox().catch((error: unknown) => console.error(error));

/** What every page stands in. */
export function AppRoot() {
  useThemeFonts();
  return (
    <ThemeProvider>
      <PersistQueryClientProvider client={queryClient} persistOptions={persistOptions}>
        <SenderOfOutbox />
        <UpdatePrompt />
        <Suspense fallback={<Loading />}>
          <Slot />
        </Suspense>
      </PersistQueryClientProvider>
    </ThemeProvider>
  );
}

/** The outbox sends for the person who is signed in, and for nobody else. */
function SenderOfOutbox() {
  const me = useMeQuery();
  const userId = me.data?.userId ?? null;
  useEffect(() => sendAs(userId), [userId]);
  return null;
}
