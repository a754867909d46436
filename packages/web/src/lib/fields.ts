import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import { ApiError } from './call.ts';

/** The sentences of a refusal by field; none for other errors. */
export function fieldsOf(error: Error | null): Record<string, string> {
  return error instanceof ApiError ? error.fields : {};
}

/** Puts an API refusal's sentences at their fields; what has no field stands at the form. @returns the sentence for the form */
export function showRefusal<T extends FieldValues>(error: unknown, setError: UseFormSetError<T>): string {
  if (!(error instanceof ApiError)) return error instanceof Error ? error.message : 'Something went wrong. Try again.';
  const fields = Object.entries(error.fields);
  for (const [path, message] of fields) setError(path as Path<T>, { message });
  return fields.length > 0 ? 'Look at the marked fields.' : error.message;
}
