import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import { useFormats } from '../../../lib/format.ts';
import { usePressClock } from '../api/run-sheet.queries.ts';

/** The clocks of who rides along: one phone may stay dry while two people work. */
export function CrewClocks({ crew }: Pick<ClockStateDto, 'crew'>) {
  const format = useFormats();
  const press = usePressClock();
  if (crew.length === 0) return null;
  return (
    <section aria-labelledby="crew-clocks" className="mb-3">
      <h2 className="sec" id="crew-clocks">
        With you <span>your name stays with what you press</span>
      </h2>
      {press.error ? (
        <p className="tape mt-2" role="alert">
          <b>{press.error.message}</b>
        </p>
      ) : null}
      {crew.map((mate) => (
        <div key={mate.personId} className="clock-row">
          <span>
            {mate.name}
            <span className="t-2">
              {mate.kind && mate.since
                ? `, ${clockKindNames[mate.kind]} since ${format.clock(mate.since)}`
                : ', not on the clock'}
            </span>
          </span>
          <button
            type="button"
            className="btn"
            disabled={press.isPending}
            onClick={() => press.mutate({ action: mate.kind ? 'stop' : 'start', mate })}
          >
            {mate.kind ? 'Clock out' : 'Clock in'} <span className="sr-only">{mate.name}</span>
          </button>
        </div>
      ))}
    </section>
  );
}
