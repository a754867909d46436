import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { progressNames } from '@driprail/shared/domain/board/progress';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { Button } from '../../../components/button.tsx';
import { StatusMark } from '../../../components/status-mark.tsx';
import type { Notice } from './use-board-moves.ts';

const order: Progress[] = ['unplaced', 'placed', 'on_the_way', 'on_site', 'working', 'part_done', 'done', 'called_off'];

/** The foot of the board: the legend with its counts, what just happened, and the keys. */
export function Sill({
  board,
  hover,
  notice,
  heldName,
  canUndo,
  onUndo,
  onDismiss,
}: {
  board: BoardDto;
  hover: string | null;
  notice: Notice | null;
  heldName: string | null;
  canUndo: boolean;
  onUndo: () => void;
  onDismiss: () => void;
}) {
  const count = (progress: Progress) =>
    progress === 'unplaced' ? board.unplaced.length : board.visits.filter((v) => v.progress === progress).length;
  return (
    <footer className="sill">
      <div className="legend">
        {order
          .filter((progress) => count(progress) > 0)
          .map((progress) => (
            <StatusMark key={progress} status={progress}>
              <b>{count(progress)}</b> {progressNames[progress]}
            </StatusMark>
          ))}
      </div>
      <p
        className={notice?.isTrouble && !hover ? 'says tape' : 'says'}
        role={notice?.isTrouble ? 'alert' : 'status'}
        aria-live="polite"
      >
        {hover ?? notice?.text ?? ''}
        {notice?.isTrouble && !hover ? (
          <>
            {' '}
            <button type="button" className="link" onClick={onDismiss}>
              Clear
            </button>
          </>
        ) : null}
      </p>
      <Button look="bare" disabled={!canUndo} onClick={onUndo}>
        <span>Undo</span>
      </Button>
      <div className="keys" aria-hidden>
        {heldName ? (
          <>
            <b>{heldName} picked up</b>
            <span>
              <kbd>←</kbd>
              <kbd>→</kbd> van
            </span>
            <span>
              <kbd>↑</kbd>
              <kbd>↓</kbd> 15 min
            </span>
            <span>
              <kbd>Enter</kbd> set down
            </span>
            <span>
              <kbd>Esc</kbd> put back
            </span>
          </>
        ) : (
          <>
            <span>
              <kbd>↑</kbd>
              <kbd>↓</kbd> visit
            </span>
            <span>
              <kbd>Space</kbd> pick up
            </span>
            <span>
              <kbd>U</kbd> unplace
            </span>
            <span>
              <kbd>Enter</kbd> open
            </span>
          </>
        )}
      </div>
    </footer>
  );
}
