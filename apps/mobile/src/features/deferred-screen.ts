import { lazy } from 'react';

/**
 * A screen for a route file: `export default deferredScreen('structures/structure-screen');`
 *
 * All screens but those of the account lie together in one chunk that the page for signing in does not load. Why one: whatever
 * two chunks share, Expo's serializer puts into a third that every page loads at once, and screens share nearly everything.
 */
export function deferredScreen(path: string) {
  return lazy(async () => {
    const { screenAt } = await import('./all-screens.ts');
    return { default: screenAt(path) };
  });
}
