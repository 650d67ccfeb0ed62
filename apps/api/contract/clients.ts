import { z } from 'zod';
import { id, listOf, optionalText, typedText } from './primitives.ts';

const clientFields = {
  name: typedText(120),
  contactName: optionalText(120),
  contactEmail: optionalText(120),
  address: optionalText(400),
};
export const createClient = z.strictObject({ id, ...clientFields });
export type CreateClient = z.infer<typeof createClient>;
export const editClient = z.strictObject(clientFields).partial();
export type EditClient = z.infer<typeof editClient>;
export const client = z.object({ id, ...clientFields });
export type Client = z.infer<typeof client>;
export const clientList = listOf(client);
