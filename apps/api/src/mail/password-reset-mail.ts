import type { Mail } from './mail.ts';

/** To a person who asked for a new password. */
export function passwordResetMail({ to, link }: { to: string; link: string }): Mail {
  return {
    to,
    subject: 'A new password for Strandnote',
    text: `Somebody, most likely you, asked for a new password. Choose one within an hour:\n\n${link}\n\nIf it was not you, nothing has to be done.`,
  };
}
