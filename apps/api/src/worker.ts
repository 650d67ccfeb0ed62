import { run } from 'graphile-worker';
import { createDeps } from './create-deps.ts';
import { readEnv } from './env.ts';
import { createTasks } from './jobs/tasks.ts';

/** Runs the jobs: mail and PDFs. Any number of workers may run against one database. */
async function main(): Promise<void> {
  const env = readEnv();
  const { deps, close } = createDeps(env);
  const runner = await run({
    connectionString: env.DATABASE_URL_JOBS,
    concurrency: 2,
    pollInterval: 1000,
    noHandleSignals: true,
    taskList: createTasks(deps),
  });
  process.send?.('running');
  const stop = () => {
    runner
      .stop()
      .then(close)
      .then(
        () => process.exit(0),
        () => process.exit(1),
      );
  };
  process.once('SIGINT', stop);
  process.once('SIGTERM', stop);
  await runner.promise;
}

main().catch((error: Error) => {
  console.error(error.message);
  process.exit(1);
});
