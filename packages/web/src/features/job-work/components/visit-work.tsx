import { useQuery } from '@tanstack/react-query';
import type { VisitWorkDto } from '@driprail/shared/contracts/job-work.contract';
import { minutesRun } from '@driprail/shared/domain/job-work/fold-work';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Loaded } from '../../../components/states.tsx';
import { useFormats } from '../../../lib/format.ts';
import { useNow } from '../../../lib/now.ts';
import { useKeyBack, visitWorkQuery } from '../api/open-work.queries.ts';
import { AskedChange } from './asked-change.tsx';
import { ChangeRow } from './change-row.tsx';
import { countSteps, workView } from './work-view.ts';
import './visit-work.css';

/** What the crew does at the car, for the desk: must-knows, steps, minutes, key, and changes to answer. */
export function VisitWork({ visitId }: { visitId: string }) {
  const query = useQuery(visitWorkQuery(visitId));
  return (
    <Loaded query={query} what="the work at the car">
      {({ work }) => <AtTheCar work={work} />}
    </Loaded>
  );
}

function AtTheCar({ work }: { work: VisitWorkDto }) {
  const format = useFormats();
  const now = useNow();
  const keyBack = useKeyBack();
  const { state, vehicles, open } = workView(work, [], '');
  const { done, all } = countSteps(vehicles);
  const asked = work.changes.filter((change) => change.state === 'asked');
  const answered = work.changes.filter((change) => change.state !== 'asked');
  const hasBegun = work.startedAt !== null || work.events.length > 0;
  if (!hasBegun && work.mustKnows.length === 0 && work.changes.length === 0 && all === 0) return null;
  return (
    <section className="vw">
      <h3 className="sec">
        At the car <span>{all > 0 && hasBegun ? `${done} of ${all} steps` : ''}</span>
      </h3>
      {asked.map((change) => (
        <AskedChange key={change.id} change={change} />
      ))}
      {state.keyOut ? (
        <div className="tape vw-key">
          <p>
            <Icon name="key" /> <b>Key not handed back.</b> {state.keyOut.by} took it {format.clock(state.keyOut.at)}
            {state.keyOut.words ? `; it goes back: ${state.keyOut.words}` : ''}.
          </p>
          <Button isBusy={keyBack.isPending} onClick={() => keyBack.mutate(work.visitId)}>
            Key handed back
          </Button>
        </div>
      ) : null}
      {work.mustKnows.length > 0 ? (
        <>
          <p>
            {open.length === 0
              ? `Must-knows confirmed${state.confirmed ? ` by ${state.confirmed.by}, ${format.clock(state.confirmed.at)}` : ''}`
              : 'Must-knows, to be confirmed before Start work'}
          </p>
          <ul className="vw-list">
            {work.mustKnows.map((one) => (
              <li key={one.key}>{one.words}</li>
            ))}
          </ul>
        </>
      ) : null}
      {hasBegun
        ? work.lines.map((line) =>
            state.runs.has(line.id) ? (
              <p className="ln" key={line.id}>
                <span>{line.serviceName}</span>
                <span className="m">{minutesRun(state.runs.get(line.id), now)}</span>
                <span>of {line.minutes} min</span>
              </p>
            ) : null,
          )
        : null}
      {[...state.used, ...state.notes, ...(state.wentOn ? [state.wentOn] : [])].map((one) => (
        <p key={`${one.at}${one.words}`} className="t-2">
          {one.words}, {one.by} {format.clock(one.at)}
        </p>
      ))}
      {answered.length > 0 ? (
        <ul className="vw-list">
          {answered.map((change) => (
            <ChangeRow key={change.id} change={change} />
          ))}
        </ul>
      ) : null}
    </section>
  );
}
