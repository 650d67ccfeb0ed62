/** Where to go after signing in. Only an address within the app is followed: a link must not send people elsewhere with our name on it. */
export function nextAddress(next: unknown): string {
  if (typeof next !== 'string' || !/^\/(?![/\\])/.test(next) || next.startsWith('/sign-in')) return '/';
  return next;
}
