import { Link } from 'react-router';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { daysOf } from '@driprail/shared/domain/time/workweek';
import { dayOf } from '@driprail/shared/domain/time/zone';
import type { PayWarning, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { Mark } from '../../../components/icon.tsx';
import { hoursMinutes, money, useFormats } from '../../../lib/format.ts';
import { dayHead, hoursSum, isAtWork, warningWords, weekSums } from './week-model.ts';
import type { Totals } from './week-model.ts';
import { hoursOf } from './working.ts';

interface Column {
  key: keyof Totals;
  label: string;
  /** Shown in every week; the others only where somebody has such pay. */
  isAlways: boolean;
}

const columns: Column[] = [
  { key: 'hourly', label: 'Hourly', isAlways: true },
  { key: 'flat', label: 'Flat', isAlways: false },
  { key: 'commission', label: 'Commission', isAlways: true },
  { key: 'overtimePremium', label: 'Premium', isAlways: true },
  { key: 'makeUp', label: 'Make-up', isAlways: false },
  { key: 'tips', label: 'Tips', isAlways: true },
  { key: 'adjustments', label: 'Adjust', isAlways: true },
];

interface Props {
  dto: PayWeekDto;
  chosenId: string | null;
  now: string;
  /** How a person is paid, in a few words. */
  plan: (personId: string) => string;
}

/** Everybody's week: exact hours of each day on hung bars, then the pay by kind. The chosen row runs into the sheet. */
export function WeekTable({ dto, chosenId, now, plan }: Props) {
  const { week, people } = dto;
  const days = daysOf(week);
  const sums = weekSums(people);
  const shown = columns.filter((column) => column.isAlways || sums[column.key] !== 0);
  return (
    <table className={shown.length === columns.length ? 'led is-full' : 'led'}>
      <thead>
        <tr>
          <th scope="col">Name</th>
          {days.map((day) => (
            <th key={day} scope="col" className="d">
              {dayHead(day)}
            </th>
          ))}
          <th scope="col">Hours</th>
          <th scope="col">Over 40</th>
          {shown.map((column) => (
            <th key={column.key} scope="col" className="k">
              {column.label}
            </th>
          ))}
          <th scope="col" className="g">
            Gross
          </th>
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <tr key={person.personId} className={person.personId === chosenId ? 'is-chosen' : ''}>
            <th scope="row">
              <Link
                to={`?person=${person.personId}`}
                replace
                preventScrollReset
                className="plain"
                aria-current={person.personId === chosenId ? 'true' : undefined}
              >
                <b>{person.name}</b>
                <Under dto={dto} person={person} now={now} plan={plan} />
              </Link>
            </th>
            {days.map((day) => (
              <DayCell key={day} dto={dto} person={person} day={day} now={now} />
            ))}
            <td className="h">{hoursMinutes(person.hoursWorked)}</td>
            <td className={isNone(person.overtimeHours) ? 'z' : 'ot'}>
              {isNone(person.overtimeHours) ? '–' : hoursMinutes(person.overtimeHours)}
            </td>
            {shown.map(({ key }) => (
              <td key={key} className={person.totals[key] === 0 ? 'k z' : 'k'}>
                {key === 'adjustments' && person.totals[key] !== 0
                  ? signed(person.totals[key])
                  : orDash(person.totals[key])}
              </td>
            ))}
            <td className="g">{money(person.totals.gross)}</td>
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <th scope="row">{people.length === 1 ? '1 person' : `${people.length} people`}</th>
          <td className="d" colSpan={days.length} />
          <td className="h">{hoursMinutes(hoursSum(people, 'hoursWorked'))}</td>
          <td>{hoursMinutes(hoursSum(people, 'overtimeHours'))}</td>
          {shown.map(({ key }) => (
            <td key={key} className="k">
              {money(sums[key])}
            </td>
          ))}
          <td className="g">{money(sums.gross)}</td>
        </tr>
      </tfoot>
    </table>
  );
}

const isNone = (hours: string) => exact(hours).equals(0);
const orDash = (cents: number) => (cents === 0 ? '–' : money(cents));
const signed = (cents: number) => (cents > 0 ? `+${money(cents)}` : money(cents));

/** Trouble outranks the plan. */
function Under({ dto, person, now, plan }: { dto: PayWeekDto; person: PersonWeek; now: string; plan: Props['plan'] }) {
  const { zone } = useFormats();
  const isSettled = dto.week.state === 'locked';
  const warning = isSettled ? undefined : person.warnings.find((w) => !isAtWork(w, dto, now, zone));
  if (!warning) return <span>{plan(person.personId)}</span>;
  return (
    <span className="wn">
      <Mark name="m-late" /> {warningWords[warning.code]}
    </span>
  );
}

/** An open entry hatches the day on which it began, and the days it runs on to say nothing. */
function DayCell({ dto, person, day, now }: { dto: PayWeekDto; person: PersonWeek; day: string; now: string }) {
  const format = useFormats();
  const isOpen = (w: PayWarning) => w.code === 'open_entry' && dto.week.state !== 'locked';
  const open = person.warnings.find(isOpen);
  const since = open?.entryId ? dto.warningTimes[open.entryId] : undefined;
  const hours = person.hoursByDay[day];
  if (open && since) {
    const sinceDay = dayOf(since, format.zone);
    const isLive = isAtWork(open, dto, now, format.zone);
    if (sinceDay === day && isLive) {
      return (
        <td className="d">
          <span title={`On the clock since ${format.clock(since)}`}>{hours ? hoursMinutes(hours) : '0:00'}</span>
          <small>so far</small>
        </td>
      );
    }
    if (sinceDay === day) {
      return (
        <td className="d is-miss">
          <Link to={hoursOf(day, open.entryId ?? undefined)} title="No clock-out">
            in {format.clock(since)}
          </Link>
        </td>
      );
    }
    if (!isLive && day > sinceDay && hours) return <td className="d is-run">open</td>;
  }
  if (!hours) return <td className="d z">–</td>;
  const width = Math.min(100, Number(exact(hours).mul(10).floor().toFraction()));
  return (
    <td className="d" style={{ '--w': width } as React.CSSProperties}>
      {hoursMinutes(hours)}
    </td>
  );
}
