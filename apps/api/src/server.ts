import { createServer } from 'node:http';
import { assertRolesAreSafe } from '@strandnote/db';
import { createApp } from './app.ts';
import { createDeps } from './create-deps.ts';
import { readEnv } from './env.ts';

/** Starts the API and the web app on one port, and ends when it is told to, after the last request. */
async function main(): Promise<void> {
  const env = readEnv();
  await assertRolesAreSafe(env.DATABASE_URL_APP);
  const { deps, close } = createDeps(env);
  const server = createServer(createApp(deps));
  server.once('error', (error: NodeJS.ErrnoException) => {
    const busy = error.code === 'EADDRINUSE';
    console.error(busy ? `Port ${env.PORT} of ${env.HOST} is in use. Set PORT to a free one and start again.` : error.message);
    process.exit(1);
  });
  server.listen(env.PORT, env.HOST, () => process.send?.('listening'));
  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    server.close(() => {
      close().then(
        () => process.exit(0),
        () => process.exit(1),
      );
    });
    server.closeIdleConnections();
    // A request that hangs does not keep the process for ever.
    setTimeout(() => process.exit(1), 10_000).unref();
  };
  // The program that started this one is gone: nobody else would stop it.
  process.once('disconnect', stop);
  process.once('SIGINT', stop);
  process.once('SIGTERM', stop);
}

main().catch((error: Error) => {
  console.error(error.message);
  process.exit(1);
});
