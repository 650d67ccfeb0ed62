import { join, normalize } from 'node:path';
import { expect, test } from 'vitest';
import { importsOf, read, sourceFiles } from './source-files.ts';

const workspaces = ['apps/mobile', 'apps/api', 'packages/core', 'packages/db', 'tests'];
const mayImport: Record<string, RegExp> = {
  'packages/core': /^(\.|ml-matrix$|simple-statistics$|zod$)/,
  'packages/db': /^(\.|node:|@strandnote\/core(\/report-content)?$|drizzle-orm|drizzle-kit$|pg$|zod$|graphile-worker$)/,
  'apps/mobile': /^(?!@strandnote\/db|node:|express|pg$|drizzle)/,
  'apps/api': /^(?!@strandnote\/mobile|react|expo)/,
  tests: /./,
};

function workspaceOf(path: string): string {
  return workspaces.find((workspace) => path.startsWith(`${workspace}/`)) ?? '';
}

test('each workspace imports only the packages that the plan of the house allows it', () => {
  const wrong = sourceFiles().flatMap((path) => {
    // Start-up programs run before packages are installed; the rules are for what they start.
    const allowed = path.includes('/bin/') ? undefined : mayImport[workspaceOf(path)];
    return allowed
      ? importsOf(path)
          .filter((name) => !allowed.test(name))
          .map((name) => `${path} imports ${name}`)
      : [];
  });
  expect(wrong).toEqual([]);
});

test('no file reaches into another workspace by a relative path', () => {
  const wrong = sourceFiles().flatMap((path) => {
    if (path.includes('/bin/') || path.startsWith('tests/')) return [];
    return importsOf(path)
      .filter((name) => name.startsWith('.') && !normalize(join(path, '..', name)).startsWith(`${workspaceOf(path)}/`))
      .map((name) => `${path} imports ${name}`);
  });
  expect(wrong).toEqual([]);
});

test('the contract imports only zod, the core and itself', () => {
  const wrong = sourceFiles()
    .filter((path) => path.startsWith('apps/api/contract/'))
    .flatMap((path) =>
      importsOf(path)
        .filter((name) => !/^(\.\/|zod$|@strandnote\/core)/.test(name))
        .map((name) => `${path} imports ${name}`),
    );
  expect(wrong).toEqual([]);
});

test('core keeps no clock, randomness, environment or input and output', () => {
  const impure = /\b(Date\.now|new Date\(\)|Math\.random|process\.|require\(|globalThis|localStorage|fetch\()/;
  const wrong = sourceFiles().filter((path) => path.startsWith('packages/core/src/') && impure.test(withoutComments(path)));
  expect(wrong).toEqual([]);
});

test('only apps/api/src/env.ts reads the environment of the server', () => {
  const wrong = sourceFiles().filter(
    (path) => path.startsWith('apps/api/src/') && path !== 'apps/api/src/env.ts' && /process\.env/.test(withoutComments(path)),
  );
  expect(wrong).toEqual([]);
});

test('files of core import each other without cycles', () => {
  const graph = new Map<string, string[]>();
  for (const path of sourceFiles().filter((file) => file.startsWith('packages/core/src/'))) {
    graph.set(
      path,
      importsOf(path)
        .filter((name) => name.startsWith('.'))
        .map((name) => normalize(join(path, '..', name))),
    );
  }
  expect(findCycle(graph)).toBeNull();
});

function withoutComments(path: string): string {
  return read(path).replace(/\/\*[\s\S]*?\*\/|(^|\s)\/\/.*$/gm, '');
}

function findCycle(graph: Map<string, string[]>): string[] | null {
  const done = new Set<string>();
  const walk = (path: string, trail: string[]): string[] | null => {
    if (trail.includes(path)) return [...trail.slice(trail.indexOf(path)), path];
    if (done.has(path)) return null;
    for (const next of graph.get(path) ?? []) {
      const cycle = walk(next, [...trail, path]);
      if (cycle) return cycle;
    }
    done.add(path);
    return null;
  };
  for (const path of graph.keys()) {
    const cycle = walk(path, []);
    if (cycle) return cycle;
  }
  return null;
}
