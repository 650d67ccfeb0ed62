import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../..', import.meta.url));

/** Every file of the project that is or will be committed, as paths from the root. */
export function projectFiles(): string[] {
  const listed = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard', '-z'], { cwd: root, encoding: 'utf8' });
  return listed.split('\0').filter((path) => path !== '');
}

/** The TypeScript and module sources among them. */
export function sourceFiles(): string[] {
  return projectFiles().filter((path) => /\.(ts|tsx|mjs)$/.test(path));
}

export function read(path: string): string {
  return readFileSync(join(root, path), 'utf8');
}

/** What a source file imports or re-exports, as written. */
export function importsOf(path: string): string[] {
  return [
    ...read(path).matchAll(
      /(?:^|\n)\s*(?:import|export)\b[^;'"]*?from\s*['"]([^'"]+)['"]|import\(\s*['"]([^'"]+)['"]\s*\)|(?:^|\n)import\s+['"]([^'"]+)['"]/g,
    ),
  ].map((match) => match[1] ?? match[2] ?? match[3]!);
}
