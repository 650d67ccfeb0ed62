import { dirname, join, normalize } from 'node:path';
import { expect, test } from 'vitest';
import { read } from './source-files.ts';

const door = 'packages/core/src/index.ts';

/** The names that a file's export list re-exports, with the file that each comes from. */
function publicNames(path: string): { name: string; from: string }[] {
  return [...read(path).matchAll(/export\s*\{([^}]*)\}\s*from\s*'([^']+)'/g)].flatMap((match) =>
    match[1]!
      .split(',')
      .map((entry) => entry.trim())
      .filter((entry) => entry !== '' && !entry.startsWith('type '))
      .map((entry) => ({ name: entry.split(' as ')[0]!.trim(), from: normalize(join(dirname(path), match[2]!)) })),
  );
}

test('every public function of core says what it does, in which units, and where it comes from', () => {
  const names = publicNames(door);
  expect(names.length).toBeGreaterThan(20);
  const bare = names.filter(({ name, from }) => {
    const source = read(from);
    const declared = new RegExp(`export (?:async )?(?:function|const|class) ${name}\\b`).exec(source);
    if (!declared) return true;
    return !/\*\/\s*$/.test(source.slice(0, declared.index));
  });
  expect(bare).toEqual([]);
});
