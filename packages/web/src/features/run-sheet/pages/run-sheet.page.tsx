import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { isEnded } from '@driprail/shared/domain/board/progress';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { PhoneMenu } from '../../../app/shell/phone-menu.tsx';
import { Loaded } from '../../../components/states.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { useNow } from '../../../lib/now.ts';
import { useSession } from '../../../lib/session.tsx';
import { dismiss, useOutbox } from '../../../lib/outbox/outbox.ts';
import { useOnline } from '../../../lib/use-online.ts';
import { runSheetQuery, usePressVisit } from '../api/run-sheet.queries.ts';
import { applyWaiting } from '../components/apply-waiting.ts';
import { ActionBar } from '../components/action-bar.tsx';
import { BreakTape } from '../components/break-tape.tsx';
import { ChangesTape } from '../components/changes-tape.tsx';
import { ClockBox } from '../components/clock-box.tsx';
import { DayLinks } from '../components/day-links.tsx';
import { Drive } from '../components/drive.tsx';
import { Driving } from '../components/driving.tsx';
import { NextCard } from '../components/next-card.tsx';
import { PhoneHead } from '../components/phone-head.tsx';
import { RunPanel, type Panel } from './run-panel.tsx';
import { StillOnClock } from '../components/still-on-clock.tsx';
import { useMark } from './use-mark.ts';
import { VisitRow } from '../components/visit-row.tsx';
import { WipeLock } from '../components/wipe-lock.tsx';
import './run-sheet.css';

/** One crew's day, in order, on a phone in a driveway. */
export function RunSheetPage() {
  const { company, user } = useSession();
  const { zone } = company;
  const today = dayOf(serverNow().toISOString(), zone);
  const { day = today } = useParams();
  const sheet = useQuery(runSheetQuery(user.id, day));
  const isOnline = useOnline();
  return (
    <main className={isOnline ? 'ph' : 'ph is-adrift'} id="main">
      <Loaded query={sheet} what="the run sheet">
        {(data) => <RunSheet kept={data} />}
      </Loaded>
    </main>
  );
}

function RunSheet({ kept }: { kept: RunSheetDto }) {
  const now = useNow();
  const outbox = useOutbox();
  const sheet = applyWaiting(kept, outbox.waiting, now);
  const [panel, setPanel] = useState<Panel | null>(null);
  const [isPassenger, setPassenger] = useState(false);
  const press = usePressVisit();
  const markVisit = useMark(sheet, press.mutate, (visit) => setPanel({ kind: 'start', visitId: visit.id }));
  const isToday = sheet.day === dayOf(now, sheet.zone);
  const at =
    sheet.visits.find((visit) => ['on_the_way', 'on_site', 'working'].includes(visit.progress)) ??
    sheet.visits.find((visit) => visit.progress === 'placed');
  const isDriving = isToday && at?.progress === 'on_the_way' && !isPassenger;
  const last = [...sheet.visits].reverse().find((visit) => isEnded(visit.progress) && visit.undoable);
  const shown = sheet.visits.find((visit) => visit.id === panel?.visitId);
  // A press that has not left the phone is taken back on the phone.
  const unsent = outbox.isSending ? undefined : outbox.waiting.filter((waiting) => waiting.path === 'visit').at(-1);
  return (
    <>
      <PhoneHead
        above={formatDay(sheet.day)}
        title={sheet.vanName ?? 'No van'}
        menu={(ability) => <PhoneMenu ability={ability} />}
      >
        {sheet.clock ? <ClockBox clock={sheet.clock} /> : null}
      </PhoneHead>
      <ChangesTape sheet={sheet} isQuiet={isDriving} />
      {isToday ? <StillOnClock sheet={sheet} /> : null}
      {isToday && !isDriving && sheet.clock ? <BreakTape clock={sheet.clock} now={now} /> : null}
      {isDriving && at ? (
        <Driving
          visit={at}
          from={sheet.visits.slice(0, sheet.visits.indexOf(at)).findLast((visit) => visit.times.arrivedAt)}
          onOpenSheet={() => setPassenger(true)}
        />
      ) : (
        <>
          <p className="crew-line t-2">
            <DayLinks sheet={sheet} today={dayOf(now, sheet.zone)} />
            <WipeLock />
          </p>
          {sheet.clock?.forgotten.length ? (
            <p className="tape mb-3">
              <b>No clock-out.</b> The clock still runs from another day.{' '}
              <Link to={paths.clock}>Say when you stopped</Link>
            </p>
          ) : null}
          <div className="leg">
            <div className="rail" />
            {sheet.visits.length === 0 ? (
              <p className="empty">Nothing hangs here {isToday ? 'today' : 'that day'}. New work shows up by itself.</p>
            ) : null}
            <ol>
              {sheet.visits.map((visit, index) => (
                <li key={visit.id} className={visit.id === at?.id ? 'is-at' : isEnded(visit.progress) ? 'is-over' : ''}>
                  <Drive from={sheet.visits[index - 1]} to={visit} />
                  {visit.id === at?.id ? (
                    <>
                      <i className="bead" aria-hidden />
                      <NextCard
                        visit={visit}
                        now={now}
                        workPath={paths.work(sheet.day, visit.id)}
                        collectPath={paths.collect(sheet.day, visit.id)}
                        onTrouble={() => setPanel({ kind: 'trouble', visitId: visit.id })}
                        onTip={() => setPanel({ kind: 'tip', visitId: visit.id })}
                      />
                    </>
                  ) : (
                    <VisitRow visit={visit} onOpen={() => setPanel({ kind: 'look', visitId: visit.id })} />
                  )}
                </li>
              ))}
            </ol>
          </div>
        </>
      )}
      <footer className="ph-act">
        {press.error && panel === null ? (
          <p className="tape mb-2" role="alert">
            <b>{press.error.message}</b>
          </p>
        ) : null}
        {unsent && isToday ? (
          <button type="button" className="btn w-full mb-2" onClick={() => void dismiss(unsent.key)}>
            Take back “{unsent.words}”
          </button>
        ) : null}
        {at && isToday ? (
          <ActionBar
            visit={at.progress === 'placed' && last ? { ...at, undoable: last.undoable } : at}
            now={now}
            isBusy={press.isPending}
            isQuiet={isDriving}
            onPress={(kind) => void markVisit(kind === 'undo' && at.progress === 'placed' && last ? last : at, kind)}
            onPartDone={() => setPanel({ kind: 'part_done', visitId: at.id })}
          />
        ) : last && isToday ? (
          <div className="below">
            <p className="flex-1 self-center">The day is done.</p>
            <button
              type="button"
              className="btn"
              disabled={press.isPending}
              onClick={() => press.mutate({ visit: last, kind: 'undo' })}
            >
              Take back “Done”
            </button>
            <Link className="btn" to={paths.collect(sheet.day, last.id)}>
              Get paid
            </Link>
          </div>
        ) : (
          <p className="t-2 py-2">
            {sheet.visits.length === 0
              ? 'No visits.'
              : isToday
                ? 'The day is done.'
                : 'Marks are made on the day itself.'}
          </p>
        )}
      </footer>
      {shown && panel ? (
        <RunPanel sheet={sheet} visit={shown} kind={panel.kind} now={now} press={press} onPanel={setPanel} />
      ) : null}
    </>
  );
}
