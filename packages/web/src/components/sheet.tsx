import { useId } from 'react';
import type { ReactNode } from 'react';
import { Icon } from './icon.tsx';
import { useModal } from './use-modal.ts';

/** A modal sheet of paper hung by two hooks. Esc and the cross close it; focus goes back to where it came from. */
export function Sheet({
  title,
  onClose,
  width,
  children,
}: {
  title: ReactNode;
  onClose: () => void;
  width?: number;
  children: ReactNode;
}) {
  const dialog = useModal();
  const titleId = useId();
  return (
    <dialog
      ref={dialog}
      className="sheet"
      aria-labelledby={titleId}
      style={width ? ({ '--sheet-width': `${width}px` } as React.CSSProperties) : undefined}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
    >
      <div className="sheet-in">
        <header className="sheet-head">
          <h2 className="t-hang" id={titleId}>
            {title}
          </h2>
          <button type="button" className="btn bare" aria-label="Close" onClick={onClose}>
            <Icon name="x" />
          </button>
        </header>
        {children}
      </div>
    </dialog>
  );
}

export function SheetFoot({ children }: { children: ReactNode }) {
  return <footer className="sheet-foot">{children}</footer>;
}
