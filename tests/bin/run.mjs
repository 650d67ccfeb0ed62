// Runs every test there is on a cluster of its own, or those whose path contains a given word:
//   npm test            npm test -- core/stiff-string
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { cleanEnv, install, installDebian, root } from '../../apps/api/bin/bootstrap.mjs';
import { exportWeb } from '../../apps/mobile/bin/export-web.mjs';
import { startCluster } from '../../packages/db/bin/postgres.mjs';

install();
installDebian({
  '/usr/bin/chromium': 'chromium',
  '/usr/bin/pdfsig': 'poppler-utils',
  '/usr/bin/qpdf': 'qpdf',
  '/usr/bin/openssl': 'openssl',
  '/usr/lib/python3/dist-packages/scipy': 'python3-scipy',
});
const cluster = startCluster({ home: join(root, '.data', 'test'), port: Number(process.env.TEST_PG_PORT ?? 55433), durable: false });
exportWeb();
const result = spawnSync(join(root, 'tests/node_modules/.bin/vitest'), ['run', ...process.argv.slice(2)], {
  cwd: join(root, 'tests'),
  stdio: 'inherit',
  env: { ...cleanEnv, TEST_DATABASE_URL: cluster.url('postgres') },
});
cluster.stop();
process.exit(result.status ?? 1);
