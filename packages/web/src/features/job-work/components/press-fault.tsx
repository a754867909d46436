/** A press that could not even be kept on the phone. */
export function PressFault({ error }: { error: Error | null }) {
  if (!error) return null;
  return (
    <p className="tape my-2" role="alert">
      <b>{error.message}</b> Press again; if it stays, call dispatch.
    </p>
  );
}
