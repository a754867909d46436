import type { StatementDto } from '@driprail/shared/contracts/pay.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';
import type { PayLine } from '@driprail/shared/domain/pay/pay-week.types';
import { formatDay } from '@driprail/shared/domain/time/format';
import { daysOf } from '@driprail/shared/domain/time/workweek';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { hoursMinutes, money, useFormats } from '../../../lib/format.ts';
import { ledgerGroups } from './ledger.ts';
import { LedgerSection, LineCells } from './ledger-line.tsx';
import { StatementBalances } from './time-off/statement-balances.tsx';
import { dayHead, weekSpan } from './week-model.ts';
import { WorkingSteps } from './working-steps.tsx';

interface Props {
  statement: StatementDto;
  /** The owner's links to the board, rates and hours; the person paid reads the words. */
  hasLinks: boolean;
}

/** One person's statement, a page of its own in print: every line with its job, each opens to how it was worked. */
export function StatementPaper({ statement, hasLinks }: Props) {
  const { week, person, companyName } = statement;
  const days = daysOf(week);
  return (
    <article className="hung stmt page" aria-label={`Pay statement of ${person.name}, week ${week.number}`}>
      <div className="stmt-head">
        <div>
          <h2 className="t-hang">{person.name}</h2>
          <p>{companyName}</p>
        </div>
        <div className="r">
          <p>
            <b>Pay week {week.number}</b>
          </p>
          <p>{weekSpan(week)}</p>
          <p>
            <StateWords week={week} />
          </p>
        </div>
      </div>
      <dl className="stmt-days">
        {days.map((day) => {
          const hours = person.hoursByDay[day];
          const width = hours ? Number(decimalText(exact(hours), 2)) : 0;
          return (
            <div key={day} style={{ '--v': width } as React.CSSProperties}>
              <dt>{dayHead(day)}</dt>
              <dd>{hours ? hoursMinutes(hours) : '–'}</dd>
            </div>
          );
        })}
        <div className="sum">
          <dt>Hours</dt>
          <dd>{hoursMinutes(person.hoursWorked)}</dd>
        </div>
      </dl>
      {ledgerGroups(person).map((group) => (
        <LedgerSection key={group.key} group={group}>
          {group.lines.map((line) => (
            <StatementLine key={line.key} statement={statement} line={line} hasLinks={hasLinks} />
          ))}
        </LedgerSection>
      ))}
      <p className="total">
        Gross <span className="t-level">{money(person.totals.gross)}</span>
      </p>
      <WaitingLine person={person} />
      <YearLine statement={statement} />
      <StatementBalances rows={statement.timeOff} isExpected={week.state !== 'locked'} />
      <p className="stmt-note">
        Gross pay in US dollars, before taxes and other withholding, which a licensed payroll processor works out.
        {person.regularRate ? ` The week’s regular rate is ${decimalText(exact(person.regularRate), 4)} an hour.` : ''}
      </p>
    </article>
  );
}

/** Commission that is earned once customers pay: shown, in no sum. */
function WaitingLine({ person: { waiting } }: { person: StatementDto['person'] }) {
  if (!waiting) return null;
  const numbers = waiting.jobs.map((job) => job.jobNumber).join(', ');
  return (
    <p className="stmt-note">
      Commission of {money(waiting.amountCents)} waits until the customer pays (
      {waiting.jobs.length === 1 ? 'job' : 'jobs'} {numbers}); it is settled in the week the payment comes in, with the
      overtime it brings.
    </p>
  );
}

function YearLine({ statement: { yearToDate } }: { statement: StatementDto }) {
  const { year, weeks, hours, grossCents, tipCents, overtimePremiumCents } = yearToDate;
  return (
    <dl className="stmt-year">
      <dt>
        {year} to date, {weeks === 1 ? '1 week' : `${weeks} weeks`}
      </dt>
      <dd>
        Gross <b>{money(grossCents)}</b>
      </dd>
      <dd>
        Hours <b>{hoursMinutes(hours)}</b>
      </dd>
      <dd>
        Overtime premium <b>{money(overtimePremiumCents)}</b>
      </dd>
      <dd>
        Tips in the gross <b>{money(tipCents)}</b>
      </dd>
    </dl>
  );
}

function StateWords({ week }: { week: StatementDto['week'] }) {
  const format = useFormats();
  if (week.state === 'locked' && week.lockedAt) {
    return (
      <>
        Locked {formatDay(dayOf(week.lockedAt, format.zone))}, {format.clock(week.lockedAt)}
      </>
    );
  }
  return <b>{week.state === 'checked' ? 'Checked, not locked yet' : 'Draft, may still change'}</b>;
}

function StatementLine({ statement, line, hasLinks }: Props & { line: PayLine }) {
  const corrected = line.correctsLineId ? statement.correctedLines[line.correctsLineId] : undefined;
  return (
    <li>
      <details>
        <summary className="pl">
          <LineCells line={line} customers={statement.customers} corrected={corrected} />
        </summary>
        <div className="stmt-why">
          <WorkingSteps
            line={line}
            lines={statement.person.lines}
            customers={statement.customers}
            hasLinks={hasLinks}
          />
          <p>{line.rule}</p>
        </div>
      </details>
    </li>
  );
}
