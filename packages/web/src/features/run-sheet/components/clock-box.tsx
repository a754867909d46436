import { Link } from 'react-router';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { useFormats } from '../../../lib/format.ts';

/** The clock's state, always visible; press it for the toggles. */
export function ClockBox({ clock }: { clock: ClockStateDto }) {
  const format = useFormats();
  return (
    <Link to={paths.clock} className={clock.open ? 'clock-box' : 'clock-box is-out'}>
      <Icon name="clock" />
      <span>
        {clock.open ? (
          <>
            {clockKindNames[clock.open.kind]},{' '}
            <span className="whitespace-nowrap">in since {format.clock(clock.inSince ?? clock.open.startedAt)}</span>
          </>
        ) : (
          'Not on the clock'
        )}
        <b>{formatMinutes(clock.todayMinutes)}</b>
      </span>
    </Link>
  );
}
