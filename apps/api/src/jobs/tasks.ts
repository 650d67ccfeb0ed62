import type { TaskList } from 'graphile-worker';
import type { AppDeps } from '../deps.ts';
import { smtpMail } from '../mail/send-mail.ts';
import { renderReportTask } from '../reports/render-report.task.ts';
import type { JobName } from './enqueue.ts';
import { sendMailTask } from './send-mail.task.ts';

/** Every job by its name. */
export function createTasks(deps: AppDeps): TaskList & Record<JobName, unknown> {
  return {
    mail: sendMailTask(deps.env, smtpMail(deps.env)),
    'render-report': renderReportTask(deps),
  };
}
