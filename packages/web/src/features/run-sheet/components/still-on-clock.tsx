import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { isEnded } from '@driprail/shared/domain/board/progress';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import { useFormats } from '../../../lib/format.ts';
import { usePressClock } from '../api/run-sheet.queries.ts';

/** After the last visit the clock is easily forgotten: it is asked for, never guessed. */
export function StillOnClock({ sheet }: { sheet: RunSheetDto }) {
  const press = usePressClock();
  const format = useFormats();
  const open = sheet.clock?.open;
  const isOver = sheet.visits.length > 0 && sheet.visits.every((visit) => isEnded(visit.progress));
  if (!open || !isOver || open.isForgotten) return null;
  return (
    <div className="tape changes" role="status">
      <p>
        <b>Still on the clock?</b> {clockKindNames[open.kind]} since {format.clock(open.startedAt)}.
      </p>
      <p className="flex gap-2">
        <button
          type="button"
          className="btn"
          disabled={press.isPending}
          onClick={() => press.mutate({ action: 'stop' })}
        >
          Clock out now
        </button>
        {open.kind === 'shop' ? null : (
          <button
            type="button"
            className="btn"
            disabled={press.isPending}
            onClick={() => press.mutate({ action: 'start', kind: 'shop' })}
          >
            Yes, shop work
          </button>
        )}
      </p>
    </div>
  );
}
