import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';

const source = fileURLToPath(new URL('../../apps/mobile/src', import.meta.url));

function routesUnder(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    return statSync(path).isDirectory() ? routesUnder(path) : [path];
  });
}

const routes = routesUnder(join(source, 'app')).map((path) => ({
  name: relative(join(source, 'app'), path),
  text: readFileSync(path, 'utf8'),
}));
/** Loaded with the first page: frames, signing in, and what leads there. */
const first = /^(\(account\)\/|index\.tsx$|\+not-found\.tsx$)|_layout\.tsx$/;

test('routes are only routes: a few lines that name a screen', () => {
  expect(routes.length).toBeGreaterThan(8);
  expect(routes.filter(({ text }) => text.split('\n').length > 4).map(({ name }) => name)).toEqual([]);
});

test('every screen behind signing in is deferred, and the file that a route names exports exactly one screen', () => {
  const wrong = routes
    .filter(({ name }) => !first.test(name))
    .flatMap(({ name, text }) => {
      const path = text.match(/^export default deferredScreen\('([\w/-]+-screen)'\);$/m)?.[1];
      if (path === undefined) return [`${name} does not defer its screen`];
      const file = join(source, 'features', `${path}.tsx`);
      if (!existsSync(file)) return [`${name} names features/${path}.tsx, which does not exist`];
      const screens = [...readFileSync(file, 'utf8').matchAll(/^export (?:function|const) (\w+Screen)\b/gm)];
      return screens.length === 1 ? [] : [`features/${path}.tsx exports ${screens.length} screens`];
    });
  expect(wrong).toEqual([]);
});
