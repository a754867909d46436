import type { ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import { breakDue } from '@driprail/shared/domain/time/break-reminder';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { usePressClock } from '../api/run-sheet.queries.ts';

/** Reminds of the break that the house's rule asks for by now; takes nothing away and records nothing by itself. */
export function BreakTape({ clock, now }: { clock: ClockStateDto; now: string }) {
  const press = usePressClock();
  const due = breakDue(clock.today, clock.breaks, now);
  if (!due || clock.open?.isForgotten) return null;
  return (
    <div className="tape changes" role="status">
      <p>
        <b>Time for a {clockKindNames[due.kind].toLowerCase()}?</b> {formatMinutes(due.minutes)} of work without one.
      </p>
      <p>
        <button
          type="button"
          className="btn"
          disabled={press.isPending}
          onClick={() => press.mutate({ action: 'start', kind: due.kind })}
        >
          {clockKindNames[due.kind]} starts now
        </button>
      </p>
    </div>
  );
}
