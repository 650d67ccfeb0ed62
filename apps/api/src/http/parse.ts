import type { z } from 'zod';
import { AppError } from './errors.ts';

/** Parses what came in by its schema; each problem stands beside the field that caused it. */
export function parse<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const errors = parsed.error.issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({ field: [...issue.path, key].join('.'), message: 'This field is not known.' }))
      : [{ field: issue.path.join('.'), message: issue.message }],
  );
  throw new AppError(
    'invalid-input',
    errors
      .map(({ message }) => message)
      .slice(0, 3)
      .join(' '),
    { errors },
  );
}
