// Formatting, lint rules and types of the whole project.
import { install, run } from '../../apps/api/bin/bootstrap.mjs';

install();
run('biome', ['check', '.']);
for (const project of ['packages/core', 'packages/db', 'apps/api/contract', 'apps/api', 'apps/mobile', 'tests'])
  run('tsc', ['-p', project]);
