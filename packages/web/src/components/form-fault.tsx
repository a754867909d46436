/** What a form's refusal says when no field of it is to blame. */
export function FormFault({
  error,
  fields,
  className = '',
}: {
  error: Error | null;
  fields: Record<string, string>;
  className?: string;
}) {
  if (!error || Object.keys(fields).length > 0) return null;
  return (
    <p className={`tape ${className}`} role="alert">
      <b>{error.message}</b>
    </p>
  );
}
