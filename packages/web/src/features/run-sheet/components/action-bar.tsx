import { useEffect, useState } from 'react';
import { Link } from 'react-router';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import type { ProgressAction } from '@driprail/shared/domain/board/progress';
import { actionNames, nextActions } from '@driprail/shared/domain/board/progress';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { useFormats } from '../../../lib/format.ts';
import { isWalkDue } from './walk-line.tsx';

const steps = [
  { action: 'set_off', label: 'On my way', time: 'setOffAt' },
  { action: 'arrive', label: 'Arrived', time: 'arrivedAt' },
  { action: 'start_work', label: 'Start work', time: 'startedAt' },
  { action: 'finish', label: 'Done', time: 'endedAt' },
] as const;

interface ActionBarProps {
  visit: RunVisitDto;
  now: string;
  isBusy: boolean;
  /** On the way only the main action and its taking back are there. */
  isQuiet: boolean;
  onPress: (kind: ProgressAction | 'undo') => void;
  onPartDone: () => void;
}

/** The thumb's place: the four steps, one main action, and the last one taken back while it is fresh. */
export function ActionBar({ visit, now, isBusy, isQuiet, onPress, onPartDone }: ActionBarProps) {
  const format = useFormats();
  const [asksFor, setAsksFor] = useState<string | null>(null);
  const main = nextActions(visit.progress)[0];
  // Done is pressed, then confirmed: a wet thumb must not end a job.
  const isAsking = asksFor === `${visit.id}:${visit.progress}`;
  const press = (kind: ProgressAction) => {
    if (kind === 'finish' && !isAsking) setAsksFor(`${visit.id}:${visit.progress}`);
    else {
      setAsksFor(null);
      onPress(kind);
    }
  };
  const canUndo = visit.undoable !== null && Date.parse(visit.undoable.until) > Date.parse(now);
  return (
    <>
      {isQuiet ? null : (
        <ol className="steps" aria-label="Steps">
          <i className="rail-h" aria-hidden />
          {steps.map((step) => {
            const at = visit.times[step.time];
            const isHere = main === step.action;
            return (
              <li
                key={step.action}
                className={isHere ? 'is-here' : at ? 'is-past' : ''}
                aria-current={isHere ? 'step' : undefined}
              >
                {isHere ? <i className="bead" aria-hidden /> : null}
                {step.label}
                <small>{at ? format.clock(at) : isHere ? 'next' : ' '}</small>
              </li>
            );
          })}
        </ol>
      )}
      {isAsking ? (
        <div className="ask">
          <p>
            Is everything at <b>{visit.customerName}</b> done?
          </p>
          <div className="grid grid-cols-[1fr_1.6fr] gap-2">
            <button type="button" className="btn" onClick={() => setAsksFor(null)}>
              Not yet
            </button>
            <button type="button" className="ph-main seal" disabled={isBusy} onClick={() => press('finish')}>
              Yes, done
            </button>
          </div>
        </div>
      ) : main === 'start_work' && isWalkDue(visit) ? (
        <Link className="ph-main" to={paths.walkRound(visit.id)}>
          <Icon name="camera" /> Walk-round
        </Link>
      ) : main && main !== 'call_off' ? (
        <button
          type="button"
          className={main === 'finish' ? 'ph-main seal' : 'ph-main'}
          disabled={isBusy}
          onClick={() => press(main)}
        >
          {actionNames[main]}
        </button>
      ) : null}
      <div className="below">
        {main === 'start_work' && isWalkDue(visit) ? (
          <button type="button" className="btn" disabled={isBusy} onClick={() => press(main)}>
            {actionNames[main]}
          </button>
        ) : null}
        {visit.progress === 'working' && !isAsking ? (
          <button type="button" className="btn" onClick={onPartDone}>
            Part done
          </button>
        ) : null}
        {canUndo && visit.undoable ? (
          <UndoButton
            label={actionNames[visit.undoable.action]}
            until={visit.undoable.until}
            isBusy={isBusy}
            onUndo={() => onPress('undo')}
          />
        ) : null}
      </div>
    </>
  );
}

/** Counts down, so that nobody wonders why it left. */
function UndoButton({
  label,
  until,
  isBusy,
  onUndo,
}: {
  label: string;
  until: string;
  isBusy: boolean;
  onUndo: () => void;
}) {
  const [left, setLeft] = useState<number | null>(null);
  useEffect(() => {
    const measure = () => setLeft(Math.max(0, Math.round((Date.parse(until) - serverNow().getTime()) / 1000)));
    const timer = setInterval(measure, 1000);
    return () => clearInterval(timer);
  }, [until]);
  return (
    <button type="button" className="btn" disabled={isBusy} onClick={onUndo}>
      Take back “{label}”{left !== null && left > 0 && left < 600 ? ` (${left} s)` : ''}
    </button>
  );
}
