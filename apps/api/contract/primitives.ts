import { z } from 'zod';

/** Identifier made by the client, so that a create can be sent twice and happen once. */
export const id = z.uuid();
export const isoDate = z.iso.date();
export const isoTime = z.iso.datetime({ offset: true });
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/, 'A SHA-256 is 64 hexadecimal digits.');

/** Text that somebody types: trimmed, not empty, with a bound. */
export function typedText(maximum = 200) {
  return z.string().trim().min(1, 'Write something here.').max(maximum, `At most ${maximum} characters.`);
}

/** Text that may be empty. Without a default: in a partial edit a default would empty what was not sent. */
export function optionalText(maximum = 2000) {
  return z.string().trim().max(maximum, `At most ${maximum} characters.`);
}

export const emailAddress = z.string().trim().toLowerCase().pipe(z.email('An e-mail address looks like name@firm.example.'));

/** A finite SI quantity within physical limits; the sentence names the quantity, the client converts the unit. */
export function quantity(name: string, { above, from, to }: { above?: number; from?: number; to?: number }) {
  let schema = z.number(`${name} is missing.`).refine(Number.isFinite, `${name} must be a number.`);
  if (above !== undefined) schema = schema.refine((x) => x > above, `${name} must be more than ${above}.`);
  if (from !== undefined) schema = schema.refine((x) => x >= from, `${name} must be ${from} or more.`);
  if (to !== undefined) schema = schema.refine((x) => x <= to, `${name} must be ${to} or less.`);
  return schema;
}

/** Where a value comes from; the source sets its default uncertainty. */
export const propertySource = z.enum(['weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed']);
export type PropertySource = z.infer<typeof propertySource>;

/** A point in the structure's own axes: x along, y across, z up (m). */
export const point = z.strictObject({ x: z.number(), y: z.number(), z: z.number() });
export type Point = z.infer<typeof point>;

/** A reply that lists things. */
export function listOf<Item extends z.ZodType>(item: Item) {
  return z.object({ items: z.array(item) });
}

/** The reply to a command that has nothing to show but that it was done. */
export const done = z.object({ done: z.literal(true) });
