import type { z } from 'zod';
import { AppError, type FieldProblem } from './errors.ts';

/**
 * Parses what came in by its schema; each problem stands beside the field that caused it.
 *
 * @throws AppError `invalid-input`
 */
export function parse<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw refuse(parsed.error.issues.flatMap(problemsOf));
  const unstorable = [...unstorableTexts(parsed.data, [])];
  if (unstorable.length > 0) throw refuse(unstorable);
  return parsed.data;
}

function refuse(errors: FieldProblem[]): AppError {
  const sentences = errors.map(({ message }) => message).slice(0, 3);
  return new AppError('invalid-input', sentences.join(' '), { errors });
}

function problemsOf(issue: z.core.$ZodIssue): FieldProblem[] {
  if (issue.code !== 'unrecognized_keys') return [{ field: issue.path.join('.'), message: issue.message }];
  return issue.keys.map((key) => ({ field: [...issue.path, key].join('.'), message: 'This field is not known.' }));
}

/** PostgreSQL stores neither the character zero nor half of a surrogate pair; such a text came from a broken paste. */
function* unstorableTexts(value: unknown, path: string[]): Generator<FieldProblem> {
  if (typeof value === 'string') {
    if (/\0|\p{Surrogate}/u.test(value)) yield { field: path.join('.'), message: 'This text has a character that cannot be stored.' };
  } else if (typeof value === 'object' && value !== null) {
    for (const [name, part] of Object.entries(value)) yield* unstorableTexts(part, [...path, name]);
  }
}
