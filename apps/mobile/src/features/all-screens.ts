import type { ComponentType } from 'react';

/** Metro's own: every module below a folder whose path matches, bundled into the chunk of this file. */
interface ModuleContext {
  (path: string): Record<string, ComponentType>;
  keys: () => string[];
}
declare const require: { context: (folder: string, deep: boolean, pattern: RegExp) => ModuleContext };

const screens = require.context('.', true, /-screen\.tsx$/);

/** The screen in features/<path>.tsx: the component whose name ends in Screen. */
export function screenAt(path: string): ComponentType {
  const module = screens(`./${path}.tsx`);
  const name = Object.keys(module).find((candidate) => candidate.endsWith('Screen'));
  if (!name) throw new Error(`features/${path}.tsx exports no screen.`);
  return module[name]!;
}
