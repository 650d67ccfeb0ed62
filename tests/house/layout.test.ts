import { expect, test } from 'vitest';
import { projectFiles, read, sourceFiles } from './source-files.ts';

test('the top level holds the plan of the house and nothing else', () => {
  const top = new Set(projectFiles().map((path) => path.split('/')[0]!));
  const allowed = [
    'apps',
    'packages',
    'tests',
    'package.json',
    'pnpm-workspace.yaml',
    'pnpm-lock.yaml',
    'tsconfig.base.json',
    'biome.json',
    'README.md',
    'DEVELOPERS.md',
  ];
  expect([...top].filter((name) => !name.startsWith('.') && !allowed.includes(name))).toEqual([]);
});

test('file names are kebab-case words of the trade, not drawers for leftovers', () => {
  const drawers = /(^|[/-])(utils?|helpers?|common|misc|shared|stuff|v2|legacy|old|new)([.-]|\/|$)/;
  // Expo Router reads meaning from brackets, parentheses, plus and underscore in the names of routes.
  const odd = sourceFiles().filter((path) => {
    const plain = path.startsWith('apps/mobile/src/app/') ? path.replace(/[()[\]+_]/g, '').replace(/\.\.\./g, '') : path;
    return !/^[a-z0-9./-]+$/.test(plain.replace(/\[?\w+Id\]?/g, 'id')) || (drawers.test(plain) && !/\/cables\/new|\/new\.tsx$/.test(plain));
  });
  expect(odd).toEqual([]);
});

// A file longer than this hides something; each exception has its reason.
const longFiles: Record<string, string> = {};
test('files stay short', () => {
  const long = sourceFiles()
    .filter((path) => !path.startsWith('packages/db/migrations/'))
    .map((path) => ({ path, lines: read(path).split('\n').length - 1 }))
    .filter(({ path, lines }) => lines > (/^apps\/mobile\/src\/features\/.*-screen\.tsx$/.test(path) ? 200 : 250) && !(path in longFiles));
  expect(long).toEqual([]);
  expect(Object.keys(longFiles).filter((path) => read(path).split('\n').length - 1 <= 200)).toEqual([]);
});

test('no file names a machine, a registry or a workplace', () => {
  // Spelt in pieces so that this file does not name them either.
  const words = [`/wo${'rk'}/`, `registry.npm${'js'}`, `deb.deb${'ian'}`, `../sha${'red'}/`, `/tm${'p'}/brief`];
  const naming = projectFiles()
    .filter((path) => /\.(ts|tsx|mjs|js|json|md|yaml|sql|css|html)$|\.ci\/run$/.test(path))
    .filter((path) => words.some((word) => read(path).includes(word)));
  expect(naming).toEqual([]);
});

test('every version is pinned exactly', () => {
  const loose = projectFiles()
    .filter((path) => path.endsWith('package.json'))
    .flatMap((path) => {
      const manifest = JSON.parse(read(path));
      return Object.entries<string>({ ...manifest.dependencies, ...manifest.devDependencies })
        .filter(([, version]) => !/^(\d+\.\d+\.\d+(-[\w.]+)?|workspace:\*)$/.test(version))
        .map(([name, version]) => `${path}: ${name} ${version}`);
    });
  expect(loose).toEqual([]);
});

test('no test is skipped or left alone on stage', () => {
  const marks = /\b(?:test|it|describe)\.(?:skip|only|todo|skipIf|runIf|fails)\b/;
  expect(sourceFiles().filter((path) => path.startsWith('tests/') && !path.startsWith('tests/house/') && marks.test(read(path)))).toEqual(
    [],
  );
});
