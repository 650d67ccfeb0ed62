import { createTransport } from 'nodemailer';
import type { Env } from '../env.ts';
import type { Mail } from './mail.ts';

export type SendMail = (mail: Omit<Mail, 'path'>) => Promise<void>;

/** Mail over SMTP. Without a server to send through, sending fails and the queue tries again: no message is lost in silence. */
export function smtpMail({ SMTP_URL, MAIL_FROM }: Pick<Env, 'SMTP_URL' | 'MAIL_FROM'>): SendMail {
  if (SMTP_URL === undefined) {
    return () => Promise.reject(new Error('No mail can be sent: SMTP_URL is not set.'));
  }
  const transport = createTransport(SMTP_URL);
  return async (mail) => {
    await transport.sendMail({ from: MAIL_FROM, ...mail });
  };
}
