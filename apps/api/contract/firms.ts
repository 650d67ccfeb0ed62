import { z } from 'zod';
import { id, optionalText, typedText } from './primitives.ts';

export const letterhead = z.strictObject({
  addressLines: z.array(typedText(120)).max(6, 'At most six lines.'),
  phone: optionalText(60),
  email: optionalText(120),
  registration: optionalText(200),
});
export type Letterhead = z.infer<typeof letterhead>;

export const firm = z.object({
  id,
  name: z.string(),
  timeZone: z.string(),
  letterhead,
  reportPrefix: z.string(),
  demonstration: z.boolean(),
});
export type Firm = z.infer<typeof firm>;

export const editFirm = z
  .strictObject({ name: typedText(120), timeZone: typedText(60), letterhead, reportPrefix: typedText(12) })
  .partial();
export type EditFirm = z.infer<typeof editFirm>;
