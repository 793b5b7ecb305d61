import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import { ApiError } from './api';

/**
 * Puts what the server refused at the fields it names.
 * @param fields the form's own; what belongs to none of them is returned
 * @returns the sentence for the form as a whole, or null where the fields say it all
 */
export function showRefusal<V extends FieldValues>(
  error: unknown,
  fields: readonly Path<V>[],
  setError: UseFormSetError<V>,
): string | null {
  if (!(error instanceof ApiError))
    return 'Something broke on this page. Load it again; nothing that was saved is lost.';
  let shown = 0;
  for (const [name, message] of Object.entries(error.fields)) {
    const field = fields.find((own) => own === name);
    if (!field) continue;
    setError(field, { message }, { shouldFocus: shown === 0 });
    shown++;
  }
  return shown > 0 ? null : error.message;
}
