import { useState } from 'react';
import type { ReactNode } from 'react';

const SHOWN = 3;

/** A strip of tape that shows the first few things that need somebody; the rest unfold. */
export function FoldedTape({ items }: { items: { key: string; children: ReactNode }[] }) {
  const [isOpen, setOpen] = useState(false);
  if (items.length === 0) return null;
  const shown = isOpen ? items : items.slice(0, SHOWN);
  const more = items.length - shown.length;
  return (
    <div className="tape pay-tape" role="status">
      {shown.map(({ key, children }) => (
        <p key={key}>{children}</p>
      ))}
      {more > 0 || isOpen ? (
        <p>
          <button type="button" className="link" aria-expanded={isOpen} onClick={() => setOpen(!isOpen)}>
            {isOpen ? 'Show fewer' : `and ${more} more`}
          </button>
        </p>
      ) : null}
    </div>
  );
}
