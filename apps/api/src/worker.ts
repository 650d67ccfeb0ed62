import { assertRolesAreSafe } from '@strandnote/db';
import { run } from 'graphile-worker';
import { createDeps } from './create-deps.ts';
import { readEnv } from './env.ts';
import { jobLog } from './jobs/job-log.ts';
import { createTasks } from './jobs/tasks.ts';

/** Runs the jobs: mail and PDFs. Any number of workers may run against one database. */
async function main(): Promise<void> {
  const env = readEnv();
  await assertRolesAreSafe(env.DATABASE_URL_APP);
  const { deps, close } = createDeps(env);
  const runner = await run({
    connectionString: env.DATABASE_URL_JOBS,
    concurrency: 2,
    pollInterval: 1000,
    noHandleSignals: true,
    logger: jobLog(deps.log),
    taskList: createTasks(deps),
  });
  process.send?.('running');
  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    runner
      .stop()
      .then(close)
      .then(
        () => process.exit(0),
        () => process.exit(1),
      );
  };
  process.once('disconnect', stop);
  process.once('SIGINT', stop);
  process.once('SIGTERM', stop);
  await runner.promise;
}

main().catch((error: Error) => {
  console.error(error.message);
  process.exit(1);
});
