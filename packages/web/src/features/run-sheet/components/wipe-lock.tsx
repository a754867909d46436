import { useState } from 'react';
import { useModal } from '../../../components/use-modal.ts';

/** Ignores touches while a wet screen is dried. Two presses in opposite corners, in order, end it: a towel does not do that. */
export function WipeLock() {
  const [isLocked, setLocked] = useState(false);
  return (
    <>
      <button type="button" className="link wipe" onClick={() => setLocked(true)}>
        Dry the screen
      </button>
      {isLocked ? <Lock onOpen={() => setLocked(false)} /> : null}
    </>
  );
}

function Lock({ onOpen }: { onOpen: () => void }) {
  const [isHalfway, setHalfway] = useState(false);
  const dialog = useModal();
  return (
    <dialog
      ref={dialog}
      className="wipe-lock"
      aria-label="The screen ignores touches"
      onCancel={(event) => {
        event.preventDefault();
        onOpen();
      }}
      onPointerDown={(event) => {
        // Anything but the two corners starts the order again.
        if (!(event.target instanceof HTMLButtonElement)) setHalfway(false);
      }}
    >
      <button type="button" className="btn" aria-pressed={isHalfway} onClick={() => setHalfway(true)}>
        1
      </button>
      <p>
        <b>Dry the screen.</b> Touches do nothing. Press 1, then 2.
      </p>
      <button type="button" className="btn" onClick={() => (isHalfway ? onOpen() : undefined)}>
        2
      </button>
    </dialog>
  );
}
