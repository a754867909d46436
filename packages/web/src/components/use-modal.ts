import { useEffect, useRef } from 'react';

/** A dialog that is open over everything else for as long as it is drawn. */
export function useModal() {
  const dialog = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const element = dialog.current;
    if (element && !element.open) element.showModal();
  }, []);
  return dialog;
}
