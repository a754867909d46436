import { useState } from 'react';
import { Link } from 'react-router';
import { isEnded } from '@driprail/shared/domain/board/progress';
import { stageNames } from '@driprail/shared/domain/job-work/stages';
import type { StepRef } from '@driprail/shared/domain/job-work/step';
import { nextStep, upToHere } from '@driprail/shared/domain/job-work/work-plan';
import type { PlannedStage, PlannedVehicle } from '@driprail/shared/domain/job-work/work-plan';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { Empty } from '../../../components/states.tsx';
import type { AtVisit } from '../api/work.queries.ts';
import { usePressWork } from '../api/work.queries.ts';
import { LineTimers } from './line-timers.tsx';
import { PressFault } from './press-fault.tsx';
import { SaySheet } from './say-sheet.tsx';
import { StepRow } from './step-row.tsx';
import { UsedSheet } from './used-sheet.tsx';
import type { WorkView } from './work-view.ts';
import { countSteps } from './work-view.ts';

const notePicks = [
  'All as planned',
  'Stain left in a seat',
  'Marks left, shown to the customer',
  'Wants another visit',
];

interface StepsPartProps {
  view: WorkView;
  at: AtVisit;
  day: string;
  now: string;
}

/** The checklist in order of work, by car and stage. One press ticks all up to here; the last press can be taken back. */
export function StepsPart({ view, at, day, now }: StepsPartProps) {
  const press = usePressWork(at);
  const [last, setLast] = useState<StepRef[]>([]);
  const [panel, setPanel] = useState<'used' | 'note' | null>(null);
  const { vehicles, progress, state } = view;
  const canTick = progress === 'working' || isEnded(progress);
  const next = nextStep(vehicles);
  const tick = (steps: StepRef[]) => {
    setLast(steps);
    press.mutate({ kind: 'tick', steps });
  };
  const untick = (steps: StepRef[]) => {
    setLast([]);
    press.mutate({ kind: 'untick', steps });
  };
  return (
    <section aria-label="Steps">
      {countSteps(vehicles).all === 0 ? (
        <Empty>No steps are written down for this service. The owner adds them on the service menu.</Empty>
      ) : null}
      {vehicles.map((vehicle) => (
        <Vehicle
          key={vehicle.vehicleId ?? vehicle.serviceNames.join()}
          vehicle={vehicle}
          canTick={canTick}
          onTick={tick}
          onUntick={untick}
        />
      ))}
      <LineTimers view={view} at={at} now={now} />
      {state.used.length + state.notes.length > 0 ? (
        <ul className="wk-said" aria-label="Said so far">
          {[...state.used, ...state.notes].map((one) => (
            <li key={`${one.at}${one.words}`}>
              {one.words} <span className="t-2">{one.by}</span>
            </li>
          ))}
        </ul>
      ) : null}
      <PressFault error={press.error} />
      <footer className="ph-act">
        <MainAction next={next} view={view} day={day} visitId={at.visitId} onTick={tick} isBusy={press.isPending} />
        <div className="below">
          {last.length > 0 ? (
            <button type="button" className="btn" onClick={() => untick(last)}>
              <Icon name="undo" /> Take back
            </button>
          ) : null}
          <button type="button" className="btn" disabled={!canTick} onClick={() => setPanel('used')}>
            <Icon name="bottle" /> Used otherwise
          </button>
          <button type="button" className="btn" disabled={!canTick} onClick={() => setPanel('note')}>
            <Icon name="note" /> Note
          </button>
        </div>
      </footer>
      {panel === 'used' ? <UsedSheet view={view} at={at} onClose={() => setPanel(null)} /> : null}
      {panel === 'note' ? (
        <SaySheet
          title="Note"
          label="Note on this job"
          action="Keep the note"
          picks={notePicks}
          isBusy={press.isPending}
          onClose={() => setPanel(null)}
          onSay={(words) => press.mutate({ kind: 'note', words }, { onSuccess: () => setPanel(null) })}
        />
      ) : null}
    </section>
  );
}

interface Ticking {
  canTick: boolean;
  onTick: (steps: StepRef[]) => void;
  onUntick: (steps: StepRef[]) => void;
}

function Vehicle({ vehicle, ...ticking }: Ticking & { vehicle: PlannedVehicle }) {
  const { done, all } = countSteps([vehicle]);
  if (all === 0) return null;
  return (
    <section className="wk-car" aria-label={vehicle.vehicle || vehicle.serviceNames.join(', ')}>
      <p className="wk-lead">
        <b>{vehicle.serviceNames.join(', ')}.</b> {vehicle.vehicle ? `${vehicle.vehicle}. ` : ''}
        {done} of {all} done.
      </p>
      {vehicle.stages.map((stage) => (
        <Stage key={stage.stage} stage={stage} vehicle={vehicle} {...ticking} />
      ))}
    </section>
  );
}

function Stage({
  stage,
  vehicle,
  canTick,
  onTick,
  onUntick,
}: Ticking & { stage: PlannedStage; vehicle: PlannedVehicle }) {
  const refs = upToHere(vehicle, stage.stage);
  const isThrough = stage.steps.every(({ mark }) => mark !== null);
  return (
    <section className={isThrough ? 'wk-stage is-through' : 'wk-stage'} aria-label={stageNames[stage.stage]}>
      <header>
        <h2>{stageNames[stage.stage]}</h2>
        {isThrough || refs.length === 0 ? null : (
          <button type="button" className="btn" disabled={!canTick} onClick={() => onTick(refs)}>
            Done up to here
          </button>
        )}
      </header>
      <ul className="wk-list">
        {stage.steps.map((planned) => (
          <StepRow
            key={planned.step.id}
            planned={planned}
            isDisabled={!canTick}
            onPress={() => (planned.mark ? onUntick(planned.refs) : onTick(planned.refs))}
          />
        ))}
      </ul>
    </section>
  );
}

interface MainActionProps {
  next: ReturnType<typeof nextStep>;
  view: WorkView;
  day: string;
  visitId: string;
  isBusy: boolean;
  onTick: (steps: StepRef[]) => void;
}

function MainAction({ next, view, day, visitId, isBusy, onTick }: MainActionProps) {
  if (view.progress !== 'working')
    return (
      <Link className="ph-main" to={view.open.length > 0 ? paths.work(day, visitId, 'know') : paths.runSheetDay(day)}>
        {view.open.length > 0 ? 'Must-knows first' : 'To the run sheet'}
      </Link>
    );
  if (!next)
    return (
      <Link className="ph-main seal" to={paths.work(day, visitId, 'done')}>
        All steps done
      </Link>
    );
  const { words } = next.planned.step;
  return (
    <button
      type="button"
      className={words.length > 26 ? 'ph-main is-long' : 'ph-main'}
      disabled={isBusy}
      onClick={() => onTick(next.planned.refs)}
    >
      <span>Done: {words}</span>
    </button>
  );
}
