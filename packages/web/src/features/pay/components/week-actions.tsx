import { useState } from 'react';
import { Link, useNavigate } from 'react-router';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { money } from '../../../lib/format.ts';
import type { useSetWeekState } from '../api/pay.queries.ts';
import { FilesMenu } from './paydays/files-menu.tsx';
import { isRunning, weekSpan, weekSums } from './week-model.ts';

interface Props {
  dto: PayWeekDto;
  toSettle: number;
  now: string;
  move: ReturnType<typeof useSetWeekState>;
}

/** Printing and the file at any time; checking, going back and locking as the stage allows. */
export function WeekActions({ dto, toSettle, now, move }: Props) {
  const [isLocking, setLocking] = useState(false);
  const navigate = useNavigate();
  const { week } = dto;
  const go = (to: 'draft' | 'checked' | 'locked') =>
    move.mutate({ to, version: week.version }, { onSettled: () => (to === 'locked' ? setLocking(false) : undefined) });
  const lock = () => {
    // A locked week is no longer the one at hand: its own address keeps it on the screen.
    void navigate(paths.payWeek(week.startsOn), { replace: true });
    go('locked');
  };
  const canCheck = !isRunning(week, now) && toSettle === 0;
  return (
    <>
      <Link className="btn" to={paths.paydays}>
        Paydays
      </Link>
      {week.state === 'locked' ? (
        <FilesMenu week={week} />
      ) : (
        <a
          className="btn"
          href={`/api/pay/weeks/${week.startsOn}/export.csv`}
          download={`pay-week-${week.startsOn}.csv`}
        >
          <Icon name="dn" /> CSV
        </a>
      )}
      <Link className="btn" to={paths.statement(week.startsOn, 'all')}>
        <Icon name="print" /> Print all statements
      </Link>
      {week.state === 'draft' ? (
        <Button
          look={canCheck ? 'main' : 'plain'}
          disabled={!canCheck}
          isBusy={move.isPending}
          onClick={() => go('checked')}
        >
          <span>Mark as checked</span>
        </Button>
      ) : null}
      {week.state === 'checked' ? (
        <>
          <Button isBusy={move.isPending} onClick={() => go('draft')}>
            Back to draft
          </Button>
          <Button look="seal" onClick={() => setLocking(true)}>
            <Icon name="lock" /> Lock week {week.number}
          </Button>
        </>
      ) : null}
      {isLocking ? (
        <Sheet title={`Lock week ${week.number}`} onClose={() => setLocking(false)} width={520}>
          <p className="text-[15px] leading-[22px]">
            {weekSpan(week)}: {money(weekSums(dto.people).gross)} for {dto.people.length} people.
          </p>
          <p className="mt-2 text-[15px] leading-[22px]">
            Once locked, these lines never change, and everybody sees their own statement. What is found wrong later is
            corrected by a line in an open week that names the line here.
          </p>
          <SheetFoot>
            <Button onClick={() => setLocking(false)}>Keep it open</Button>
            <Button look="seal" isBusy={move.isPending} onClick={lock}>
              <Icon name="lock" /> Lock for good
            </Button>
          </SheetFoot>
        </Sheet>
      ) : null}
    </>
  );
}
