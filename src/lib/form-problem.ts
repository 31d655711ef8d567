import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { CallProblem } from './call.ts';

/** `#/ingredients/0/massG` as the form names it: `ingredients.0.massG`. */
export function fieldOfPointer(pointer: string): string {
  return pointer.replace(/^#\/?/, '').split('/').map((step) => step.replaceAll('~1', '/').replaceAll('~0', '~')).join('.');
}

/**
 * Puts a 422's problems at their fields.
 *
 * @returns what is left to say above the form: problems of no field, and errors that are not about fields
 */
export function placeProblems<Values extends FieldValues>(error: unknown, setError: UseFormSetError<Values>, fields: readonly string[]): string | undefined {
  if (!(error instanceof CallProblem) || error.status !== 422 || !error.problem.errors) return error instanceof Error ? error.message : 'Something went wrong';
  const homeless: string[] = [];
  for (const { pointer, detail } of error.problem.errors) {
    const field = fieldOfPointer(pointer);
    if (fields.some((name) => field === name || field.startsWith(`${name}.`))) setError(field as FieldPath<Values>, { type: 'server', message: detail }, { shouldFocus: homeless.length === 0 });
    else homeless.push(detail);
  }
  return homeless.length > 0 ? homeless.join('; ') : undefined;
}
