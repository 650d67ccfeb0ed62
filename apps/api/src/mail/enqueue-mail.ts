import type { Tx } from '@strandnote/db';
import { enqueue } from '../jobs/enqueue.ts';
import type { Mail } from './mail.ts';

/** Sends mail when the transaction commits; every message has its own job, so that one bad address delays no other. */
export async function enqueueMail(tx: Pick<Tx, 'execute'>, mails: readonly Mail[]): Promise<void> {
  for (const { to, subject, text, path } of mails)
    await enqueue(tx, 'mail', { to, subject, text, ...(path === undefined ? {} : { path }) });
}
