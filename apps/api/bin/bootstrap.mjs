// Brings a fresh clone to a runnable state with nothing but Node and npm: packages may not be imported here.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../../..', import.meta.url));
const manifest = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
const pnpmVersion = manifest.packageManager.replace('pnpm@', '');
const tools = join(root, '.tools', `pnpm-${pnpmVersion}`);
export const pnpm = join(tools, 'node_modules', '.bin', 'pnpm');

// npm hands its own settings down as npm_* variables, which a nested package manager must not read.
export const cleanEnv = Object.fromEntries(Object.entries(process.env).filter(([name]) => !/^(npm_|INIT_CWD$)/i.test(name)));
cleanEnv.PATH = [join(root, 'node_modules', '.bin'), join(tools, 'node_modules', '.bin'), cleanEnv.PATH].join(delimiter);
Object.assign(cleanEnv, { EXPO_NO_TELEMETRY: '1', EXPO_OFFLINE: '1', BETTER_AUTH_TELEMETRY: '0' });

export function run(command, args, options = {}) {
  const result = spawnSync(command, args, { cwd: root, stdio: 'inherit', env: cleanEnv, ...options });
  if (result.error) throw result.error;
  if (result.status === 0) return;
  const error = new Error(`"${command} ${args.join(' ')}" ended with ${result.status ?? result.signal}.`);
  throw Object.assign(error, { output: result.output?.filter(Boolean).join('\n') });
}

/** Says in a sentence what takes a while; what the program prints is shown only when it fails. */
export function runQuietly(sentence, command, args, options = {}) {
  console.log(sentence);
  try {
    run(command, args, { encoding: 'utf8', stdio: 'pipe', ...options });
  } catch (error) {
    throw new Error(`${error.message}\n${error.output ?? ''}`);
  }
}

function ensurePnpm() {
  if (existsSync(pnpm)) return;
  mkdirSync(tools, { recursive: true });
  // A manifest of its own keeps npm from walking up into the workspace.
  writeFileSync(join(tools, 'package.json'), '{"private":true}\n');
  const quiet = ['--no-save', '--no-package-lock', '--no-audit', '--no-fund', '--loglevel=error'];
  run('npm', ['install', ...quiet, `pnpm@${pnpmVersion}`], { cwd: tools });
}

/** Installs pnpm and the locked packages. A second call with nothing changed takes a second or two. */
export function install() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) throw new Error(`Strandnote needs Node 20.19 or newer; this is ${process.version}.`);
  ensurePnpm();
  run(pnpm, ['install', '--frozen-lockfile', '--prefer-offline', '--reporter=silent'], { env: { ...cleanEnv, CI: '1' } });
}

/** Installs Debian packages whose files are missing; says what to do where that needs another user. */
export function installDebian(packagesByFile) {
  const missing = Object.entries(packagesByFile)
    .filter(([file]) => !existsSync(file))
    .map(([, name]) => name);
  if (missing.length === 0) return;
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
    throw new Error(
      `Missing: ${missing.join(', ')}. Install them, on Debian with "apt-get install ${missing.join(' ')}", and start again.`,
    );
  }
  const env = { ...cleanEnv, DEBIAN_FRONTEND: 'noninteractive' };
  const apt = (...args) => run('apt-get', ['-o', 'DPkg::Lock::Timeout=300', '-qq', ...args], { env });
  apt('update');
  apt('install', '-y', '--no-install-recommends', ...missing);
}
