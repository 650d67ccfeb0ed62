import type { Role } from '@strandnote/api/contract';
import type { Mail } from './mail.ts';

export interface InvitationMail {
  to: string;
  from: string;
  firmName: string;
  roles: Role[];
  days: number;
  link: string;
}

/** To a person who is invited: the link is the only copy of its token. */
export function invitationMail({ to, from, firmName, roles, days, link }: InvitationMail): Mail {
  return {
    to,
    subject: `Invitation to ${firmName}`,
    text: `${from} invites you to ${firmName} as ${roles.join(', ')}. The invitation holds for ${days} days:\n\n${link}`,
  };
}
