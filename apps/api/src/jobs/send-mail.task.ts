import { z } from 'zod';
import type { Env } from '../env.ts';
import type { SendMail } from '../mail/send-mail.ts';

const payload = z.object({
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  path: z.string().optional(),
  firmId: z.string().nullable(),
});

/** Sends one message; the address that it leads to is put below its text. */
export function sendMailTask(env: Pick<Env, 'publicUrl'>, send: SendMail) {
  return async (job: unknown): Promise<void> => {
    const { to, subject, text, path, firmId } = payload.parse(job);
    const address = path === undefined ? '' : `\n\n${env.publicUrl}/${firmId === null ? '' : `${firmId}/`}${path}`;
    await send({ to, subject, text: `${text}${address}\n\nStrandnote` });
  };
}
