import { demonstration, demonstrationMailList } from '@strandnote/api/contract';
import { AppError } from '../http/errors.ts';
import { publicRoute } from '../http/route.ts';
import { readMailbox } from './mailbox.ts';

export const demonstrationRoutes = [
  publicRoute({
    method: 'get',
    path: '/demonstration',
    summary: 'Whether this installation is a demonstration with invented data',
    reply: demonstration,
    handle: async ({ deps }) => ({ demonstration: deps.env.DEMONSTRATION }),
  }),
  publicRoute({
    method: 'get',
    path: '/demonstration/mail',
    summary: 'The messages that the fake mail server of a demonstration took; not found elsewhere',
    reply: demonstrationMailList,
    handle: async ({ deps }) => {
      if (!deps.env.DEMONSTRATION) throw new AppError('not-found', 'This is not a demonstration: its mail goes out.');
      return { items: await readMailbox(deps.env.DATA_DIR) };
    },
  }),
];
