import { readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';

const dist = fileURLToPath(new URL('../../apps/mobile/dist', import.meta.url));

/** What a phone can load over a weak signal in a few seconds. */
const budget = 360_000;

test('the page for signing in loads at most 360 kB of compressed script', () => {
  const page = readFileSync(join(dist, 'index.html'), 'utf8');
  const scripts = [...page.matchAll(/<script[^>]+src="([^"]+)"/g)].map((match) => match[1]!);
  expect(scripts.length).toBeGreaterThan(0);
  const bytes = scripts.reduce((sum, path) => sum + statSync(join(dist, `${path}.br`)).size, 0);
  console.log(`first page: ${Math.round(bytes / 1000)} kB of brotli in ${scripts.length} script(s)`);
  expect(bytes).toBeLessThanOrEqual(budget);
});

test('the page runs no script that is written into it, as the Content Security Policy asks', () => {
  const page = readFileSync(join(dist, 'index.html'), 'utf8');
  expect(page).not.toMatch(/<script(?![^>]*\bsrc=)/);
  expect(page).not.toMatch(/\son\w+="/);
});
