import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { addDays, dayOf, weekNumberOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { WeekStrip } from './week-strip.tsx';

interface BoardHeadProps {
  board: BoardDto;
  now: string;
  filter: string;
  onFilter: (filter: string) => void;
  onDay: (day: string) => void;
  onNew: () => void;
}

/** The day's name, the way to other days, the week's load, and what narrows the board. */
export function BoardHead({ board, now, filter, onFilter, onDay, onNew }: BoardHeadProps) {
  const { day } = board;
  const today = dayOf(now, board.zone);
  return (
    <section className="day" aria-label="Day">
      <div className="step">
        <Button look="bare" aria-label="Day before" onClick={() => onDay(addDays(day, -1))}>
          <Icon name="left" />
        </Button>
        {day === today ? (
          <span>Today</span>
        ) : (
          <button type="button" className="link" aria-label="Go to today" onClick={() => onDay(today)}>
            Today
          </button>
        )}
        <span className="t-3">week {weekNumberOf(day)}</span>
        <Button look="bare" aria-label="Day after" onClick={() => onDay(addDays(day, 1))}>
          <Icon name="right" />
        </Button>
        <input
          className="jump"
          type="date"
          aria-label="Jump to a date"
          value={day}
          onChange={(event) => event.target.value && onDay(event.target.value)}
        />
      </div>
      <h1 className="t-hang">{formatDay(day)}</h1>
      <div className="tools">
        <Button look="main" onClick={onNew}>
          <Icon name="plus" /> New job
        </Button>
        <input
          className="inp filter"
          type="search"
          placeholder="Filter the day"
          aria-label="Filter the day"
          value={filter}
          onChange={(event) => onFilter(event.target.value)}
        />
      </div>
      {board.isLocked ? <p className="t-2">This day’s pay week is locked: nothing is planned here.</p> : null}
      <WeekStrip day={day} vans={board.vans} />
    </section>
  );
}
