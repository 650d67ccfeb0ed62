/** Keeps the app on the device. A new version waits until the person takes it: it never changes a page that is being worked in. */
let waiting: ServiceWorker | null = null;
const listeners = new Set<() => void>();

export function registerServiceWorker(): void {
  if (!('serviceWorker' in navigator) || process.env.NODE_ENV !== 'production') return;
  navigator.serviceWorker
    .register('/sw.js')
    .then(watch)
    .catch((error: unknown) => console.error(error));
}

/** Whether a newer version is on the device and waits. */
export function updateWaits(): boolean {
  return waiting !== null;
}

export function subscribeToUpdates(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Starts the newer version in every open page. */
export function takeUpdate(): void {
  navigator.serviceWorker.addEventListener('controllerchange', () => location.reload(), { once: true });
  waiting?.postMessage({ type: 'SKIP_WAITING' });
}

function watch(registration: ServiceWorkerRegistration): void {
  note(registration.waiting);
  registration.addEventListener('updatefound', () => {
    const worker = registration.installing;
    worker?.addEventListener('statechange', () => {
      // The very first installation is no update: no older version runs.
      if (worker.state === 'installed' && navigator.serviceWorker.controller) note(worker);
    });
  });
  // A page that stays open for days asks for itself.
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible') registration.update().catch(() => undefined);
  });
}

function note(worker: ServiceWorker | null): void {
  waiting = worker;
  for (const listener of listeners) listener();
}
