import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockEntryDto, ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import { formatDay, formatMinutes } from '@driprail/shared/domain/time/format';
import { dayOf, minutesBetween } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { PhoneMenu } from '../../../app/shell/phone-menu.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { useFormats } from '../../../lib/format.ts';
import { useOutbox } from '../../../lib/outbox/outbox.ts';
import { useSession } from '../../../lib/session.tsx';
import { useNow } from '../../../lib/now.ts';
import { clockQuery, usePressClock } from '../api/run-sheet.queries.ts';
import { applyToClocks } from '../components/apply-waiting.ts';
import { BreakTape } from '../components/break-tape.tsx';
import { ChangeSheet } from '../components/change-sheet.tsx';
import { CrewClocks } from '../components/crew-clocks.tsx';
import { OwnHours } from '../components/own-hours.tsx';
import { PhoneHead } from '../components/phone-head.tsx';
import './run-sheet.css';

const toggles: { kind: ClockKindName; note: string }[] = [
  { kind: 'shop', note: 'loading, mixing, washing towels' },
  { kind: 'travel', note: 'between jobs, paid' },
  { kind: 'job', note: 'at the car' },
  { kind: 'waiting', note: 'rain, customer not there' },
  { kind: 'rest_break', note: 'short, paid' },
  { kind: 'meal_break', note: '30 min, free of duty' },
];

/** The clock as large toggles. It follows the marks on the run sheet, and can be changed here. */
export function ClockPage() {
  const clock = useQuery(clockQuery(useSession().user.id));
  const now = useNow();
  const format = useFormats();
  return (
    <main className="ph" id="main">
      <PhoneHead
        above={formatDay(dayOf(now, format.zone))}
        title="Clock"
        menu={(ability) => <PhoneMenu ability={ability} />}
      />
      <p className="crew-line">
        <Link to={paths.runSheet}>
          <Icon name="left" /> Run sheet
        </Link>
      </p>
      <div className="leg">
        <div className="rail" />
        <Loaded query={clock} what="the clock">
          {(data) =>
            data.clock ? (
              <Clock clock={data.clock} now={now} />
            ) : (
              <Empty>This login belongs to nobody on the crew, so it has no clock.</Empty>
            )
          }
        </Loaded>
      </div>
    </main>
  );
}

function Clock({ clock: kept, now }: { clock: ClockStateDto; now: string }) {
  const format = useFormats();
  const clock = applyToClocks(kept, useOutbox().waiting);
  const press = usePressClock();
  const [wrong, setWrong] = useState<ClockEntryDto | null>(null);
  const { open } = clock;
  return (
    <>
      <p>{open ? `${clockKindNames[open.kind]} since ${format.clock(open.startedAt)}` : 'Not on the clock'}</p>
      <p className="big-clock" role="timer">
        {formatMinutes(clock.todayMinutes)}
      </p>
      <p className="t-2">Today. This week {formatMinutes(clock.weekMinutes)}.</p>
      {clock.forgotten.map((entry) => (
        <p key={entry.id} className="tape mt-2">
          <b>No clock-out since {formatDay(dayOf(entry.startedAt, format.zone))}.</b> Nobody guesses it.{' '}
          <button type="button" className="link" onClick={() => setWrong(entry)}>
            Say when you stopped
          </button>
        </p>
      ))}
      {press.error ? (
        <p className="tape mt-2" role="alert">
          <b>{press.error.message}</b>
        </p>
      ) : null}
      <BreakTape clock={clock} now={now} />
      <div className="toggles" role="group" aria-label="Kind of time">
        {toggles.map(({ kind, note }) => (
          <button
            key={kind}
            type="button"
            className={open?.kind === kind ? 'btn is-on' : 'btn'}
            aria-pressed={open?.kind === kind}
            disabled={press.isPending}
            onClick={() => press.mutate({ action: 'start', kind })}
          >
            {clockKindNames[kind]}
            <small>{note}</small>
          </button>
        ))}
      </div>
      <CrewClocks crew={clock.crew} />
      <OwnHours today={dayOf(now, format.zone)} personId={clock.personId} />
      <h2 className="sec">
        Today <span>press one that is not right</span>
      </h2>
      {clock.today.length === 0 ? <Empty>Nothing yet. Clock in below.</Empty> : null}
      {clock.today.map((entry) => (
        <button key={entry.id} type="button" className="clock-row" onClick={() => setWrong(entry)}>
          <span>
            {clockKindNames[entry.kind]}
            {entry.jobNumber ? <span className="t-2">, job {entry.jobNumber}</span> : null}
          </span>
          <span>
            {entry.endedAt ? format.span(entry.startedAt, entry.endedAt) : `since ${format.clock(entry.startedAt)}`},{' '}
            {formatMinutes(minutesBetween(entry.startedAt, entry.endedAt ?? now))}
          </span>
        </button>
      ))}
      {wrong ? <ChangeSheet entry={wrong} onClose={() => setWrong(null)} /> : null}
      <footer className="ph-act">
        {open ? (
          <button
            type="button"
            className="ph-main seal"
            disabled={press.isPending}
            onClick={() => press.mutate({ action: 'stop' })}
          >
            Clock out
          </button>
        ) : (
          <button
            type="button"
            className="ph-main"
            disabled={press.isPending}
            onClick={() => press.mutate({ action: 'start', kind: 'shop' })}
          >
            Clock in
          </button>
        )}
      </footer>
    </>
  );
}
