import { useState } from 'react';
import { useNavigate } from 'react-router';
import { isEnded, progressNames } from '@driprail/shared/domain/board/progress';
import { paths } from '../../../app/paths.ts';
import { Mark } from '../../../components/icon.tsx';
import { Picks } from '../../../components/picks.tsx';
import { TextField } from '../../../components/field.tsx';
import type { AtVisit } from '../api/work.queries.ts';
import { usePressDone, usePressWork } from '../api/work.queries.ts';
import { KeyRow } from './key-row.tsx';
import { PressFault } from './press-fault.tsx';
import type { WorkView } from './work-view.ts';
import { countSteps } from './work-view.ts';

const reasons = [
  'Not needed on this car',
  'Customer asked to leave it',
  'Tool is broken',
  'Product ran out',
  'Out of time',
];

/** What Done needs. With something missing it goes on only with a reason; Done is pressed, then confirmed. */
export function DonePart({ view, at, day }: { view: WorkView; at: AtVisit; day: string }) {
  const navigate = useNavigate();
  const work = usePressWork(at);
  const done = usePressDone(at);
  const [reason, setReason] = useState('');
  const [isAsking, setAsking] = useState(false);
  const { state, missing, progress } = view;
  const { done: ticked, all } = countSteps(view.vehicles);
  const isBlocked = missing.length > 0 && reason.trim() === '';
  const finish = async () => {
    if (missing.length > 0)
      await work.mutateAsync({ kind: 'go_on', keys: missing.map((one) => one.key), words: reason.trim() });
    await done.mutateAsync();
    void navigate(paths.collect(day, at.visitId));
  };
  return (
    <section aria-label="Done">
      <ul className="wk-fin">
        <Line isIn={ticked === all} name="Steps" says={all === 0 ? 'none written down' : `${ticked} of ${all}`} />
        <Line
          isIn
          name="Used otherwise"
          says={state.used.length === 0 ? 'no, the usual amounts' : `${state.used.length} times`}
        />
        <Line
          isIn={!missing.some((one) => one.key === 'note')}
          name="Note"
          says={state.notes.at(-1)?.words ?? 'none'}
        />
        <Line isIn={state.keyOut === null} name="Key" says={state.keyOut ? 'still out' : 'no key out'} />
      </ul>
      {state.keyOut ? <KeyRow view={view} at={at} /> : null}
      {missing.length > 0 && progress === 'working' ? (
        <section className="wk-missing" aria-label="Still missing">
          <h2 className="sec">Still missing</h2>
          <ul>
            {missing.map((one) => (
              <li key={one.key}>{one.words}</li>
            ))}
          </ul>
          <h2 className="sec">Go on without, because</h2>
          <Picks options={reasons} value={reason} onPick={setReason} className="grid grid-cols-2 gap-2 my-2" />
          <TextField
            label="Reason"
            value={reason}
            maxLength={300}
            onChange={(event) => setReason(event.target.value)}
          />
        </section>
      ) : null}
      {state.wentOn ? (
        <p className="wk-lead">
          <b>Going on without.</b> {state.wentOn.words}, {state.wentOn.by}
        </p>
      ) : null}
      <PressFault error={work.error ?? done.error} />
      <footer className="ph-act">
        {isEnded(progress) ? (
          <button type="button" className="ph-main" onClick={() => void navigate(paths.runSheetDay(day))}>
            To the run sheet
          </button>
        ) : progress !== 'working' ? (
          <p className="t-2 py-2">{progressNames[progress]}. Done comes after Start work.</p>
        ) : isAsking ? (
          <div className="grid grid-cols-[1fr_1.6fr] gap-2">
            <button type="button" className="btn wk-tall" onClick={() => setAsking(false)}>
              Not yet
            </button>
            <button
              type="button"
              className="ph-main seal"
              disabled={isBlocked || done.isPending}
              onClick={() => void finish()}
            >
              Yes, done
            </button>
          </div>
        ) : (
          <button type="button" className="ph-main seal" disabled={isBlocked} onClick={() => setAsking(true)}>
            {isBlocked ? 'Tick or say why' : 'Done'}
          </button>
        )}
      </footer>
    </section>
  );
}

function Line({ isIn, name, says }: { isIn: boolean; name: string; says: string }) {
  return (
    <li>
      <Mark name={isIn ? 'm-done' : 'm-placed'} />
      <b>{name}</b>
      <span>{says}</span>
    </li>
  );
}
