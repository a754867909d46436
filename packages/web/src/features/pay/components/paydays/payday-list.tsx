import { Link } from 'react-router';
import type { PaydayDto } from '@driprail/shared/contracts/handover.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Icon } from '../../../../components/icon.tsx';
import { money } from '../../../../lib/format.ts';
import { weekNames } from './payday-model.ts';

/** The paydays, newest first; the one on the sheet is marked. */
export function PaydayList({ paydays, chosenId }: { paydays: readonly PaydayDto[]; chosenId: string | null }) {
  return (
    <ol className="pd-list">
      {paydays.map((payday) => (
        <li key={payday.id}>
          <Link
            className="plain"
            to={`?payday=${payday.id}`}
            replace
            preventScrollReset
            aria-current={payday.id === chosenId ? 'true' : undefined}
          >
            <Icon name={payday.handedOverAt ? 'lock' : 'pen'} />
            <span>
              <b>{formatDate(payday.paysOn)}</b>
              <small>
                {weekNames(payday.weeks)}, {payday.handedOverAt ? 'handed over' : 'not handed over yet'}
              </small>
            </span>
            <span className="am">{money(payday.weeks.reduce((total, week) => total + week.grossCents, 0))}</span>
          </Link>
        </li>
      ))}
    </ol>
  );
}
