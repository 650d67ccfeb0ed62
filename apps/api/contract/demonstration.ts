import { z } from 'zod';
import { isoTime, listOf } from './primitives.ts';

/** Whether this installation is a demonstration; if so its mail goes to a fake server and can be read here. */
export const demonstration = z.object({ demonstration: z.boolean() });

export const demonstrationMail = z.object({
  id: z.string(),
  at: isoTime,
  to: z.string(),
  subject: z.string(),
  text: z.string(),
});
export type DemonstrationMail = z.infer<typeof demonstrationMail>;
export const demonstrationMailList = listOf(demonstrationMail);
