import { Suspense, lazy, useEffect, useState } from 'react';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { isEnded } from '@driprail/shared/domain/board/progress';
import type { ProgressAction } from '@driprail/shared/domain/board/progress';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import { formatDay } from '@driprail/shared/domain/time/format';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { lazyPage } from '../../../app/lazy-page.ts';
import { paths } from '../../../app/paths.ts';
import { PhoneMenu } from '../../../app/shell/phone-menu.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Loaded } from '../../../components/states.tsx';
import { useFormats } from '../../../lib/format.ts';
import { serverNow } from '../../../lib/device-clock.ts';
import { useNow } from '../../../lib/now.ts';
import { useSession } from '../../../lib/session.tsx';
import { dismiss, useOutbox } from '../../../lib/outbox/outbox.ts';
import { useOnline } from '../../../lib/use-online.ts';
import { keepDays, runSheetQuery, usePressVisit } from '../api/run-sheet.queries.ts';
import { applyWaiting } from '../components/apply-waiting.ts';
import { ActionBar } from '../components/action-bar.tsx';
import { BreakTape } from '../components/break-tape.tsx';
import { ChangesTape } from '../components/changes-tape.tsx';
import { ClockBox } from '../components/clock-box.tsx';
import { Driving } from '../components/driving.tsx';
import { NextCard } from '../components/next-card.tsx';
import { PhoneHead } from '../components/phone-head.tsx';
import { StillOnClock } from '../components/still-on-clock.tsx';
import { VisitRow } from '../components/visit-row.tsx';
import { WipeLock } from '../components/wipe-lock.tsx';
import { isWalkDue } from '../components/walk-line.tsx';
import './run-sheet.css';

// Sheets come after the first screen has painted; the worker keeps them for a dead zone.
const TroubleSheet = lazyPage(async () => (await import('../components/trouble-sheet.tsx')).TroubleSheet);
const PartDoneSheet = lazyPage(async () => (await import('../components/part-done-sheet.tsx')).PartDoneSheet);
const TipSheet = lazyPage(async () => (await import('../components/tip-sheet.tsx')).TipSheet);

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

type Panel = { kind: 'trouble' | 'part_done' | 'tip' | 'look' | 'start'; visitId: string };

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
  const close = () => {
    press.reset();
    setPanel(null);
  };
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
      {shown && panel?.kind === 'trouble' ? (
        <Suspense>
          <TroubleSheet
            visit={shown}
            next={sheet.visits.slice(sheet.visits.indexOf(shown) + 1).find((visit) => !isEnded(visit.progress))}
            isBusy={press.isPending}
            error={press.error?.message}
            onClose={close}
            onSend={(trouble) => press.mutate({ visit: shown, kind: 'trouble', ...trouble }, { onSuccess: close })}
            onCallOff={(trouble) => press.mutate({ visit: shown, kind: 'call_off', ...trouble }, { onSuccess: close })}
          />
        </Suspense>
      ) : null}
      {shown && panel?.kind === 'part_done' ? (
        <Suspense>
          <PartDoneSheet
            visit={shown}
            isBusy={press.isPending}
            error={press.error?.message}
            onClose={close}
            onSend={(part) => press.mutate({ visit: shown, kind: 'part_done', ...part }, { onSuccess: close })}
          />
        </Suspense>
      ) : null}
      {shown && panel?.kind === 'start' ? (
        <Suspense>
          <StartSheet
            visitId={shown.id}
            customerName={shown.customerName}
            onClose={close}
            onStart={(reason) => press.mutate({ visit: shown, kind: 'start_work', reason }, { onSuccess: close })}
          />
        </Suspense>
      ) : null}
      {shown && panel?.kind === 'tip' ? (
        <Suspense>
          <TipSheet visit={shown} tipsGoTo={sheet.tipsGoTo} onClose={close} />
        </Suspense>
      ) : null}
      {shown && panel?.kind === 'look' ? (
        <Sheet title={shown.customerName} onClose={close} width={480}>
          <div className="ph-sheet pb-4">
            <NextCard
              visit={shown}
              now={now}
              workPath={paths.work(sheet.day, shown.id)}
              onTrouble={() => setPanel({ kind: 'trouble', visitId: shown.id })}
              onTip={() => setPanel({ kind: 'tip', visitId: shown.id })}
            />
          </div>
        </Sheet>
      ) : null}
    </>
  );
}

type Marked = ProgressAction | 'undo';

/** Marks a visit; must-knows that nobody has confirmed, or what Done still needs, come first, on the job's page. */
function useMark(
  { day, visits }: RunSheetDto,
  mark: (press: { visit: RunVisitDto; kind: Marked }) => void,
  askWalk: (visit: RunVisitDto) => void,
) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const { user } = useSession();
  const today = useToday();
  // Fetched after the first screen has painted, so that a dead zone finds them on the phone.
  const plans = visits.map((visit) => `${visit.id}:${visit.planVersion}`).join(' ');
  useEffect(() => {
    void keepDays(client, user.id, addDays(today, 1));
    void jobWork().then((work) => work?.keepWork(client, user.id, [today, addDays(today, 1)]));
  }, [client, user.id, today, plans]);
  const visitIds = visits.map((visit) => visit.id).join(' ');
  useEffect(() => {
    void walkRound().then((walk) => walk?.keepWalkSheets(client, user.id, visitIds.split(' ').filter(Boolean)));
  }, [client, user.id, visitIds]);
  return async (visit: RunVisitDto, kind: Marked) => {
    const work = kind === 'start_work' || kind === 'finish' ? await jobWork() : null;
    const part = await work?.partBefore(client, { userId: user.id, day, visitId: visit.id, kind });
    if (part) void navigate(paths.work(day, visit.id, part));
    else if (kind === 'start_work' && isWalkDue(visit)) askWalk(visit);
    else mark({ visit, kind });
  };
}

/** Null when it can't be fetched: then the server judges alone. */
function jobWork() {
  return import('../../job-work/index.ts').catch(() => null);
}

function walkRound() {
  return import('../../walk-round/index.ts').catch(() => null);
}

const StartSheet = lazy(async () => ({ default: (await import('../../walk-round/index.ts')).StartSheet }));

function useToday(): string {
  const { zone } = useSession().company;
  return dayOf(useNow(), zone);
}

function DayLinks({ sheet, today }: { sheet: RunSheetDto; today: string }) {
  const { user } = useSession();
  const others = sheet.crewNames.filter((name) => name !== user.name);
  return (
    <>
      {others.length > 0 ? <span>With {others.join(', ')}. </span> : null}
      {sheet.day === today ? (
        <Link to={paths.runSheetDay(addDays(today, 1))}>
          Tomorrow <Icon name="right" />
        </Link>
      ) : (
        <Link to={paths.runSheet}>
          <Icon name="left" /> Today
        </Link>
      )}
    </>
  );
}

/** The drive between two stops, as a hatched slot. */
function Drive({ from, to }: { from: RunVisitDto | undefined; to: RunVisitDto }) {
  const format = useFormats();
  if (!from || isEnded(to.progress) || from.stopId === to.stopId) return null;
  const point = (visit: RunVisitDto) =>
    visit.lat === null || visit.lng === null ? null : { lat: visit.lat, lng: visit.lng };
  const travel = estimateTravel(point(from), point(to));
  return (
    <p className="drive">
      <span>
        About {travel.minutes} min{travel.kilometers === null ? '' : `, ${format.distance(travel.kilometers)}`}
      </span>
    </p>
  );
}
