// npm start: installs, starts the database, exports the web app, and runs one API and one worker process until Ctrl-C.
import { fork } from 'node:child_process';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { cleanEnv, install, root } from './bootstrap.mjs';

try {
  await start();
} catch (error) {
  console.error(error.message);
  process.exit(1);
}

async function start() {
  await assertFree(process.env.HOST ?? '127.0.0.1', readPort(process.env.PORT ?? '4310'));
  install();
  const { register } = await import('tsx/esm/api');
  register();
  const { openInstallation, dataFolder } = await import('./installation.mjs');
  const { exportWeb } = await import('../../mobile/bin/export-web.mjs');
  const installation = await openInstallation();
  try {
    exportWeb();
    await serve(installation, dataFolder);
  } catch (error) {
    installation.cluster.stop();
    throw error;
  }
}

async function serve({ cluster, urls, environment, demonstration, address }, dataFolder) {
  let accounts = null;
  let mailServer = null;
  if (demonstration) {
    const { openDemonstration } = await import('../src/demonstration/open-demonstration.ts');
    ({ accounts, mailServer } = await openDemonstration(environment, dataFolder, urls.owner));
    environment.SMTP_URL = mailServer.url;
  }
  environment.WEB_ROOT = join(root, 'apps', 'mobile', 'dist');
  const children = [run('server.ts', environment), run('worker.ts', environment)];
  const last = async () => {
    await mailServer?.stop();
    cluster.stop();
  };
  // From here on a signal, or the end of either, ends all in order.
  stopTogether(children, last);
  await Promise.all(children.map(ready));
  announce(address, accounts);
}

/** The other processes say when they are ready; one that ends instead has said why, and takes the rest with it. */
function ready(child) {
  return new Promise((resolve) => child.once('message', resolve));
}

function run(program, environment) {
  return fork(join(root, 'apps', 'api', 'src', program), [], {
    cwd: join(root, 'apps', 'api'),
    execArgv: ['--import', 'tsx'],
    env: { LOG_LEVEL: 'warn', ...cleanEnv, ...environment },
    // A signal from the terminal reaches this process, which then stops the others in order.
    detached: true,
  });
}

function announce(address, accounts) {
  console.log(`\nStrandnote runs at ${address}`);
  if (accounts) {
    console.log('\nThis is a demonstration: data are invented, frequencies simulated, signatures prove nothing, and mail stays here:');
    console.log(`${address}/demonstration/mail\n`);
    for (const { role, email, password } of accounts) console.log(`  ${role.padEnd(14)} ${email.padEnd(34)} ${password}`);
  }
  if (!accounts && !process.env.SMTP_URL) console.log('\nMail waits in the queue: set SMTP_URL to the server that sends it.');
  console.log('\nCtrl-C stops it; the data stay.');
}

/** One that ends takes the others with it; Ctrl-C ends all in order, the database last. */
function stopTogether(children, last) {
  let stopping = false;
  const stop = async (code) => {
    if (stopping) return;
    stopping = true;
    await Promise.all(children.map(ended));
    await last();
    process.exit(code);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void stop(0));
  for (const child of children) child.once('exit', (code) => void stop(code ?? 1));
}

function ended(child) {
  if (child.exitCode !== null || child.signalCode !== null) return undefined;
  return new Promise((resolve) => {
    child.once('exit', resolve);
    child.kill('SIGTERM');
  });
}

function readPort(text) {
  const port = Number(text);
  if (Number.isInteger(port) && port > 0 && port <= 65_535) return port;
  throw new Error(`PORT is "${text}". Set it to a number between 1 and 65535.`);
}

function assertFree(host, port) {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', (error) => {
      const sentences = {
        EADDRINUSE: `Port ${port} of ${host} is in use. Set PORT to a free one, for example: PORT=4320 npm start`,
        EACCES: `This user may not listen on port ${port}. Set PORT to a number above 1023.`,
      };
      reject(new Error(sentences[error.code] ?? `The address ${host}:${port} cannot be used: ${error.message}`));
    });
    probe.listen(port, host, () => probe.close(resolve));
  });
}
