import { isEnded } from '@driprail/shared/domain/board/progress';
import { minutesRun } from '@driprail/shared/domain/job-work/fold-work';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import type { AtVisit } from '../api/work.queries.ts';
import { usePressWork } from '../api/work.queries.ts';
import type { WorkView } from './work-view.ts';

/** Minutes of each service. They run by the ticks; a press starts or stops one by hand. */
export function LineTimers({ view, at, now }: { view: WorkView; at: AtVisit; now: string }) {
  const press = usePressWork(at);
  const canRun = view.progress === 'working';
  if (view.startedAt === null) return null;
  return (
    <section className="wk-timers" aria-label="Minutes of each service">
      <h2 className="sec">
        Minutes <span>run by the ticks</span>
      </h2>
      {view.work.lines.map((line) => {
        const runs = view.state.runs.get(line.id);
        const isRunning = runs?.at(-1)?.to === null && !isEnded(view.progress);
        return (
          <div key={line.id} className="row">
            <span>
              <b>{line.serviceName}</b>
              <span className="t-2">{line.vehicle}</span>
            </span>
            <span className="m">
              {minutesRun(runs, now)}
              <small>of {formatMinutes(line.minutes)}</small>
            </span>
            <button
              type="button"
              className={isRunning ? 'btn is-on' : 'btn'}
              aria-label={`${isRunning ? 'Stop' : 'Start'} ${line.serviceName}, ${line.vehicle}`}
              disabled={!canRun || press.isPending}
              onClick={() => press.mutate({ kind: isRunning ? 'stop_line' : 'start_line', lineId: line.id })}
            >
              {isRunning ? 'Stop' : 'Start'}
            </button>
          </div>
        );
      })}
    </section>
  );
}
