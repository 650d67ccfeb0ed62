import { Logger } from 'graphile-worker';
import type { Logger as Log } from 'pino';

const levels = { error: 'error', warning: 'warn', info: 'debug', debug: 'trace' } as const;

/** The queue's own words in our log. A job is named but not shown: its payload is somebody's mail. */
export function jobLog(log: Log): Logger {
  return new Logger(() => (level, message, meta) => {
    const { error, job } = (meta ?? {}) as { error?: unknown; job?: { id: string; task_identifier: string; attempts: number } };
    if (error === undefined || job === undefined) return log[levels[level]](message);
    const { id, task_identifier: task, attempts } = job;
    log.error({ err: error, job: { id, task, attempts } }, 'a job failed');
  });
}
