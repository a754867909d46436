import { useEffect, useRef } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';
import type { PayLine, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon, Mark } from '../../../components/icon.tsx';
import { money } from '../../../lib/format.ts';
import { useRemoveAdjustment } from '../api/pay.queries.ts';
import { weekTimeOffQuery } from '../api/time-off.queries.ts';
import { ledgerGroups } from './ledger.ts';
import { StatementBalances } from './time-off/statement-balances.tsx';
import { PayRecord } from './paydays/pay-record.tsx';
import { LedgerSection, LineCells } from './ledger-line.tsx';

interface Props {
  dto: PayWeekDto;
  person: PersonWeek;
  next: PersonWeek | null;
  plan: string;
  minimumWage: string | null;
  /** Whether the person was picked just now, so that on a narrow screen the sheet comes into view. */
  isPicked: boolean;
  onAdjust: () => void;
}

const stateNames = { draft: 'Draft', checked: 'Checked', locked: 'Locked' };

/** A person's ledger on the hung sheet; each amount leads to its working. */
export function PersonSheet({ dto, person, next, plan, minimumWage, isPicked, onAdjust }: Props) {
  const sheet = useRef<HTMLElement>(null);
  useEffect(() => {
    if (isPicked && matchMedia('(max-width: 1439px)').matches) sheet.current?.scrollIntoView({ block: 'start' });
  }, [isPicked, person.personId]);
  const { week } = dto;
  return (
    <aside className="hung pay-sheet" ref={sheet} aria-label={`Pay of ${person.name}`}>
      <h2 className="t-hang">{person.name}</h2>
      <p className="who">
        <span>{plan}</span>
        <span>{stateNames[week.state]}</span>
      </p>
      {person.lines.length === 0 ? <p className="empty">No pay in this week yet.</p> : null}
      {ledgerGroups(person).map((group) => (
        <LedgerSection key={group.key} group={group}>
          {group.lines.map((line) => (
            <SheetLine key={line.key} dto={dto} line={line} />
          ))}
        </LedgerSection>
      ))}
      <p className="total">
        Gross <span className="t-level">{money(person.totals.gross)}</span>
      </p>
      <Checks person={person} minimumWage={minimumWage} />
      <Balances dto={dto} personId={person.personId} />
      <div className="foot no-print">
        <Link className="btn" to={paths.statement(week.startsOn, person.personId)}>
          <Icon name="print" /> Print statement
        </Link>
        <Button onClick={onAdjust}>
          <Icon name="plus" /> {week.state === 'locked' ? 'Correction' : 'Adjustment'}
        </Button>
        <PayRecord personId={person.personId} name={person.name} />
        {next ? (
          <Link className="btn bare" to={`?person=${next.personId}`} replace preventScrollReset>
            Next: {next.name.split(' ')[0]} <Icon name="down" />
          </Link>
        ) : null}
      </div>
    </aside>
  );
}

/** Balances are kept with a locked week; of an open one they are worked out for the person on the sheet. */
function Balances({ dto: { week, timeOff }, personId }: { dto: PayWeekDto; personId: string }) {
  const isOpen = week.state !== 'locked';
  const open = useQuery({ ...weekTimeOffQuery(week.startsOn, personId), enabled: isOpen });
  return <StatementBalances rows={(isOpen ? open.data?.timeOff : timeOff[personId]) ?? []} isExpected={isOpen} />;
}

function SheetLine({ dto, line }: { dto: PayWeekDto; line: PayLine }) {
  const remove = useRemoveAdjustment();
  const adjustment = dto.adjustments.find((item) => line.key === `${item.kind}:${item.id}`);
  const working = `${paths.payWorking(dto.week.startsOn, line.personId)}?line=${encodeURIComponent(line.key)}`;
  const corrected = line.correctsLineId ? dto.correctedLines[line.correctsLineId] : undefined;
  return (
    <li className="pl">
      <LineCells
        line={line}
        customers={dto.customers}
        corrected={corrected}
        opensJob
        amount={
          <Link to={working} aria-label={`${money(line.amountCents)}, how it was worked`}>
            {money(line.amountCents)}
          </Link>
        }
      />
      {adjustment ? (
        <span className="by">
          by {adjustment.by}
          {dto.week.state === 'locked' ? null : (
            <button
              type="button"
              className="link"
              disabled={remove.isPending}
              onClick={() => remove.mutate(adjustment.id)}
            >
              Take out
            </button>
          )}
          {remove.error ? <b role="alert">{remove.error.message}</b> : null}
        </span>
      ) : null}
    </li>
  );
}

function Checks({ person, minimumWage }: { person: PersonWeek; minimumWage: string | null }) {
  const days = Object.keys(person.hoursByDay).length;
  const isOpen = person.warnings.some((w) => w.code === 'open_entry' || w.code === 'overlapping_entries');
  const rate = person.regularRate === null ? null : exact(person.regularRate);
  const isMet = rate !== null && minimumWage !== null && rate.gte(exact(minimumWage));
  return (
    <>
      {rate && isMet ? (
        <p className="chk">
          <Mark name="m-done" />
          <span>
            {decimalText(rate, 2)} an hour before tips and premium, minimum {decimalText(exact(minimumWage), 2)}
          </span>
        </p>
      ) : null}
      {days > 0 && !isOpen ? (
        <p className="chk">
          <Mark name="m-done" />
          <span>{days === 1 ? '1 day' : `${days} days`} clocked in and out</span>
        </p>
      ) : null}
    </>
  );
}
