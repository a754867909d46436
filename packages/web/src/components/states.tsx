import { useEffect, useState } from 'react';
import type { ReactNode } from 'react';

/** Loading: after a moment one bead runs the rail; after eight seconds words say so. */
export function Fetching({ what }: { what: string }) {
  const [isSlow, setSlow] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setSlow(true), 8000);
    return () => clearTimeout(timer);
  }, []);
  return (
    <div role="status" aria-live="polite">
      <span className="sr">Fetching {what}</span>
      <div className="fetching" aria-hidden>
        <i className="rail-h" />
        <i className="bead" />
      </div>
      {isSlow ? <p className="empty">Still fetching {what}.</p> : null}
    </div>
  );
}

/** A fault at its place, with what to do. */
export function Fault({ message, onRetry }: { message: string; onRetry?: () => void }) {
  return (
    <p className="tape" role="alert">
      <b>{message}</b>{' '}
      {onRetry ? (
        <button type="button" className="link" onClick={onRetry}>
          Try again
        </button>
      ) : null}
    </p>
  );
}

export function Empty({ children }: { children: ReactNode }) {
  return <p className="empty">{children}</p>;
}

interface QueryLike<T> {
  data: T | undefined;
  error: Error | null;
  refetch: () => unknown;
}

/** Renders a query's data, or that it is being fetched, or what went wrong in its place. */
export function Loaded<T>({
  query,
  what,
  children,
}: {
  query: QueryLike<T>;
  what: string;
  children: (data: T) => ReactNode;
}) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (query.error) return <Fault message={query.error.message} onRetry={() => void query.refetch()} />;
  return <Fetching what={what} />;
}
