import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form';
import { ApiProblem } from './api-problem.ts';

/**
 * Puts a refusal beside the fields that caused it, and what belongs to no field into `root`
 * (show it with `form.formState.errors.root?.message`). `fieldOf` turns the path of the body into the name in the form, or null.
 */
export function showProblem<Values extends FieldValues>(
  form: UseFormReturn<Values>,
  error: unknown,
  fieldOf: (path: string) => string | null = (path) => path,
): void {
  const fieldErrors = error instanceof ApiProblem ? error.fieldErrors : [];
  const homeless: string[] = [];
  for (const { field, message } of fieldErrors) {
    const name = fieldOf(field);
    if (name === null || !hasField(form.getValues(), name)) homeless.push(message);
    else form.setError(name as FieldPath<Values>, { type: 'server', message }, { shouldFocus: homeless.length === 0 });
  }
  if (fieldErrors.length === 0) homeless.push(error instanceof ApiProblem ? error.message : 'This could not be saved. Try again.');
  if (homeless.length > 0) form.setError('root', { type: 'server', message: homeless.join(' ') });
}

function hasField(values: unknown, path: string): boolean {
  let at: unknown = values;
  for (const key of path.split('.')) {
    if (typeof at !== 'object' || at === null || !(key in at)) return false;
    at = (at as Record<string, unknown>)[key];
  }
  return true;
}
