import { fieldsOf } from '../lib/fields.ts';

/** What went wrong with a whole form; what belongs to a field is said at the field. */
export function FormError({ error }: { error: Error | null }) {
  if (!error || Object.keys(fieldsOf(error)).length > 0) return null;
  return (
    <p className="tape mt-3" role="alert">
      {error.message}
    </p>
  );
}
