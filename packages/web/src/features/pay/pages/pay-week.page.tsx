import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams, useSearchParams } from 'react-router';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { missingCents } from '@driprail/shared/domain/pay/late-difference';
import { addDays } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty } from '../../../components/states.tsx';
import { hoursMinutes, money, useFormats } from '../../../lib/format.ts';
import { useNow } from '../../../lib/now.ts';
import { useSetWeekState, weekQuery, weeksQuery } from '../api/pay.queries.ts';
import { plansQuery } from '../api/plans.queries.ts';
import { ratesQuery, rulesQuery } from '../api/rates.queries.ts';
import { LoadedPage } from '../components/loaded-page.tsx';
import { AdjustmentSheet } from '../components/adjustment-sheet.tsx';
import type { AdjustmentStart } from '../components/adjustment-sheet.tsx';
import { WaitingTape } from '../components/jobs-paid/waiting-tape.tsx';
import { LateTape } from '../components/late-tape.tsx';
import { LateWeeksTape } from '../components/late-weeks-tape.tsx';
import { PastWeeks } from '../components/past-weeks.tsx';
import type { WeekFigures } from '../components/past-weeks.tsx';
import { PersonSheet } from '../components/person-sheet.tsx';
import { basePlanWords, planOn } from '../components/plan-base-words.ts';
import { planWords, rulesOn } from '../components/plan-words.ts';
import { StageRail } from '../components/stage-rail.tsx';
import { TimeOffSheet } from '../components/time-off/time-off-sheet.tsx';
import { TroubleTape } from '../components/trouble-tape.tsx';
import { UnendedTape } from '../components/unended-tape.tsx';
import { WeekActions } from '../components/week-actions.tsx';
import {
  hoursSum,
  isRunning,
  shareOfSales,
  troubles,
  weekAtHand,
  weekSpan,
  weekSums,
} from '../components/week-model.ts';
import { WeekDifference } from '../components/week-difference.tsx';
import { WeekTable } from '../components/week-table.tsx';
import './pay.css';
import './pay-week.css';

/** The week's pay by person, from the draft to the lock. Without a day in the address: the week at hand. */
export function PayWeekPage() {
  const { day } = useParams();
  const now = useNow();
  const weeks = useQuery(weeksQuery);
  const startsOn = day ?? weekAtHand(weeks.data?.weeks ?? [], now)?.startsOn ?? '';
  const week = useQuery(weekQuery(startsOn));
  const query = day || weeks.data ? week : { ...week, error: weeks.error, refetch: weeks.refetch };
  return (
    <LoadedPage title="Pay week" query={query} what="the pay week">
      {(dto) => <Week key={dto.week.startsOn} dto={dto} weeks={weeks.data?.weeks ?? []} now={now} />}
    </LoadedPage>
  );
}

function Week({ dto, weeks, now }: { dto: PayWeekDto; weeks: WeekFigures[]; now: string }) {
  const { zone } = useFormats();
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const [adjusting, setAdjusting] = useState<AdjustmentStart | null>(null);
  const [isPayingOff, setPayingOff] = useState(false);
  const rates = useQuery(ratesQuery).data?.rates;
  const plans = useQuery(plansQuery).data?.plans ?? [];
  const rules = useQuery(rulesQuery).data?.rules;
  const move = useSetWeekState(dto.week.startsOn);
  const { week, people } = dto;
  const warnings = troubles(dto, now, zone);
  const toSettle = warnings.filter((warning) => warning.isBlocking).length;
  const sums = weekSums(people);
  const share = shareOfSales(sums.gross, sums.tips, dto.salesCents);
  const picked = people.find((person) => person.personId === search.get('person'));
  const chosen = picked ?? people[0] ?? null;
  const next = chosen ? (people[people.indexOf(chosen) + 1] ?? null) : null;
  const plan = (personId: string, isShort = false) => {
    const planned = planOn(plans, personId, week.startsOn);
    if (planned) return basePlanWords(planned.plan);
    return rates ? planWords(rates, personId, week.endsOn, isShort) : '';
  };
  const adjust = (start: Partial<AdjustmentStart> & Pick<AdjustmentStart, 'personId' | 'name'>) =>
    setAdjusting({
      kind: week.state === 'locked' ? 'correction' : 'bonus',
      startsOn: week.state === 'locked' ? null : week.startsOn,
      mends: week.state === 'locked' ? week.startsOn : null,
      amount: '',
      lineKey: null,
      ...start,
    });
  const closeSheet = (addedTo: string | null) => {
    if (addedTo && addedTo !== week.startsOn)
      void navigate(`${paths.payWeek(addedTo)}?person=${adjusting?.personId ?? ''}`);
    setAdjusting(null);
  };

  return (
    <>
      <PageHead
        title={`Pay week ${week.number}`}
        above={<WeekSteps dto={dto} weeks={weeks} now={now} />}
        sums={[
          { label: 'Gross', value: money(sums.gross) },
          { label: 'Hours', value: hoursMinutes(hoursSum(people, 'hoursWorked')) },
          { label: 'Over 40 h', value: hoursMinutes(hoursSum(people, 'overtimeHours')) },
          { label: 'Share of sales', value: share ? `${share}%` : '–' },
        ]}
        actions={<WeekActions dto={dto} toSettle={toSettle} now={now} move={move} />}
      />
      <RailPage>
        <div className="pay-week">
          <div className="pay-main">
            <StageRail dto={dto} toSettle={toSettle} now={now} />
            {move.error ? (
              <p className="tape pay-tape" role="alert">
                <span>{move.error.message} What you see is the newest state.</span>
                <button type="button" className="link" onClick={() => move.reset()}>
                  Carry on
                </button>
              </p>
            ) : null}
            <TroubleTape dto={dto} warnings={warnings} />
            <UnendedTape unended={dto.unended} />
            {week.state === 'locked' ? null : <LateWeeksTape />}
            <WaitingTape rules={rules ?? []} />
            <LateTape
              late={dto.lateDifferences}
              onCorrect={(late) =>
                adjust({ personId: late.personId, name: late.name, amount: money(missingCents(late)) })
              }
            />
            {people.length === 0 ? (
              <Empty>
                Nobody was on the clock and nothing was finished in this week.{' '}
                <Link to={paths.hours}>Write down time</Link>
              </Empty>
            ) : (
              <div className="led-box">
                <WeekTable dto={dto} chosenId={chosen?.personId ?? null} now={now} plan={(id) => plan(id, true)} />
              </div>
            )}
            {people.length === 0 ? null : <WeekDifference week={week} />}
            {week.state === 'locked' ? null : (
              <p className="no-print mt-3">
                <Button onClick={() => setPayingOff(true)}>
                  <Icon name="plus" /> Pay time off
                </Button>
              </p>
            )}
          </div>
          {chosen ? (
            <PersonSheet
              dto={dto}
              person={chosen}
              next={next}
              plan={plan(chosen.personId)}
              minimumWage={rules ? (rulesOn(rules, week.startsOn)?.minimumWage ?? null) : null}
              isPicked={picked !== undefined}
              onAdjust={() => adjust({ personId: chosen.personId, name: chosen.name })}
            />
          ) : null}
          <PastWeeks weeks={weeks} here={{ startsOn: week.startsOn, share }} />
        </div>
      </RailPage>
      {isPayingOff ? (
        <TimeOffSheet personId={null} startsOn={week.startsOn} onClose={() => setPayingOff(false)} />
      ) : null}
      {adjusting ? <AdjustmentSheet start={adjusting} onClose={closeSheet} /> : null}
    </>
  );
}

/** The week before and after, and all weeks by number. */
function WeekSteps({ dto: { week }, weeks, now }: { dto: PayWeekDto; weeks: WeekFigures[]; now: string }) {
  const navigate = useNavigate();
  const isKnown = weeks.some((known) => known.startsOn === week.startsOn);
  return (
    <>
      <Link to={paths.payWeek(addDays(week.startsOn, -7))} aria-label="Week before">
        <Icon name="left" />
      </Link>
      <span>
        {weekSpan(week)}
        {isRunning(week, now) ? ', still running' : ''}
      </span>
      {isRunning(week, now) ? null : (
        <Link to={paths.payWeek(addDays(week.startsOn, 7))} aria-label="Week after">
          <Icon name="right" />
        </Link>
      )}
      <select
        className="week-pick"
        aria-label="Go to a pay week"
        value={week.startsOn}
        onChange={(event) => void navigate(paths.payWeek(event.target.value))}
      >
        {isKnown ? null : <option value={week.startsOn}>Week {week.number}</option>}
        {weeks.map((known) => (
          <option key={known.startsOn} value={known.startsOn}>
            Week {known.number}, {known.state}
          </option>
        ))}
      </select>
    </>
  );
}
