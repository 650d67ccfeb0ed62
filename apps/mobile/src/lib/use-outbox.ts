import { useSyncExternalStore } from 'react';
import { currentOutbox, subscribeToOutbox } from './outbox.ts';
import { type OutboxState, type OutboxStatus, statusOf } from './outbox-state.ts';

export function useOutbox(): OutboxState {
  return useSyncExternalStore(subscribeToOutbox, currentOutbox);
}

/** "on this phone", "sent" or "refused" with the reason, of the thing with this key; null if nothing of it was entered here. */
export function useOutboxStatus(key: string): OutboxStatus | null {
  return statusOf(useOutbox(), key);
}
