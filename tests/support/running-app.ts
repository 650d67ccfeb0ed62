import { type ChildProcess, spawn } from 'node:child_process';
import { chmodSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../..', import.meta.url));

export interface DemonstrationAccount {
  role: 'engineer' | 'checker' | 'administrator' | 'client';
  email: string;
  password: string;
}

export interface RunningApp {
  address: string;
  accounts: DemonstrationAccount[];
  /** Everything that npm start printed. */
  output: () => string;
  stop: () => Promise<number | null>;
}

/**
 * The product as a newcomer starts it: `npm start` with a data folder and ports of its own, its own cluster, its own demonstration.
 * It ends with Ctrl-C, as a newcomer ends it.
 */
export async function startApp(folder: string = newFolder()): Promise<RunningApp> {
  const [port, postgresPort] = [await freePort(), await freePort()];
  const child = spawn('npm', ['start'], {
    cwd: root,
    detached: true,
    env: { ...process.env, DATA_DIR: folder, PORT: String(port), PG_PORT: String(postgresPort), NODE_ENV: 'production' },
  });
  let printed = '';
  child.stdout.on('data', (chunk: Buffer) => {
    printed += chunk.toString();
  });
  child.stderr.on('data', (chunk: Buffer) => {
    printed += chunk.toString();
  });
  await untilPrinted(child, () => printed, 'Ctrl-C stops it');
  return {
    address: `http://127.0.0.1:${port}`,
    accounts: JSON.parse(readFileSync(join(folder, 'demonstration.json'), 'utf8')),
    output: () => printed,
    stop: () => stop(child),
  };
}

/** A data folder that nobody else has; PostgreSQL's account must be able to walk to it. */
export function newFolder(): string {
  const folder = mkdtempSync('/var/tmp/strandnote-e2e-');
  chmodSync(folder, 0o755);
  return folder;
}

export function removeFolder(folder: string): void {
  rmSync(folder, { recursive: true, force: true });
}

function untilPrinted(child: ChildProcess, printed: () => string, sentence: string): Promise<void> {
  return new Promise((resolve, reject) => {
    const look = setInterval(() => {
      if (!printed().includes(sentence)) return;
      clearInterval(look);
      resolve();
    }, 100);
    child.once('exit', (code) => {
      clearInterval(look);
      reject(new Error(`npm start ended with ${code}:\n${printed()}`));
    });
  });
}

function stop(child: ChildProcess): Promise<number | null> {
  return new Promise((resolve) => {
    child.once('exit', resolve);
    // The whole group, as a terminal sends Ctrl-C.
    process.kill(-child.pid!, 'SIGINT');
  });
}

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as { port: number };
      probe.close(() => resolve(port));
    });
  });
}
