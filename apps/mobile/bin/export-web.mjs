// Exports the web app into apps/mobile/dist, unless nothing that it is made of has changed. Packages may not be imported here.
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { extname, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { brotliCompressSync, constants, gzipSync } from 'node:zlib';
import { cleanEnv, pnpm, root, run, runQuietly } from '../../api/bin/bootstrap.mjs';

const mobile = fileURLToPath(new URL('..', import.meta.url));
const dist = join(mobile, 'dist');
const work = join(mobile, '.expo');
const stamp = join(work, 'export-inputs.sha256');
const inputs = ['apps/mobile', 'packages/core/src', 'apps/api/contract', 'pnpm-lock.yaml'];
const notInputs = new Set(['node_modules', 'dist', '.expo', 'expo-env.d.ts']);
const compressible = new Set(['.js', '.css', '.html', '.json', '.svg', '.ttf', '.webmanifest']);

/** Leaves an up-to-date export in apps/mobile/dist. Without changes it takes a few milliseconds, otherwise about a minute. */
export function exportWeb() {
  const hash = hashOfInputs();
  if (existsSync(join(dist, 'index.html')) && existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return;
  // Exported beside the old one and swapped in when whole: an interrupted export breaks nothing.
  const next = join(work, 'export');
  rmSync(next, { recursive: true, force: true });
  mkdirSync(work, { recursive: true });
  const env = { ...cleanEnv, CI: '1', NODE_ENV: 'production' };
  runQuietly(
    'Exporting the web app, which takes up to a minute.',
    pnpm,
    ['exec', 'expo', 'export', '--platform', 'web', '--output-dir', relative(mobile, next)],
    { cwd: mobile, env },
  );
  run(process.execPath, [join(mobile, 'bin', 'make-service-worker.mjs'), next]);
  precompress(next);
  rmSync(dist, { recursive: true, force: true });
  renameSync(next, dist);
  writeFileSync(stamp, hash);
}

function hashOfInputs() {
  const hash = createHash('sha256');
  for (const path of inputs.flatMap((input) => filesUnder(join(root, input), notInputs))) {
    hash
      .update(`${relative(root, path)}\n`)
      .update(readFileSync(path))
      .update('\n');
  }
  return hash.digest('hex');
}

function filesUnder(path, except = new Set()) {
  if (statSync(path).isFile()) return [path];
  return readdirSync(path, { withFileTypes: true })
    .filter((entry) => !except.has(entry.name))
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => (entry.isDirectory() ? filesUnder(join(path, entry.name), except) : [join(path, entry.name)]));
}

/** The server sends these as they are: compressing at every request would cost more and give less. */
function precompress(folder) {
  for (const path of filesUnder(folder).filter((file) => compressible.has(extname(file)))) {
    const bytes = readFileSync(path);
    const params = { [constants.BROTLI_PARAM_QUALITY]: 11, [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length };
    writeFileSync(`${path}.br`, brotliCompressSync(bytes, { params }));
    writeFileSync(`${path}.gz`, gzipSync(bytes, { level: 9 }));
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) exportWeb();
