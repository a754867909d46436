import { NavLink } from 'react-router';
import { paths } from '../../../app/paths.ts';
import { serverNow } from '../../../lib/device-clock.ts';
import { useFormats } from '../../../lib/format.ts';
import { dayOf } from '@driprail/shared/domain/time/zone';

/** The three papers of the Money page. */
export function MoneyTabs() {
  const { zone } = useFormats();
  const today = dayOf(serverNow().toISOString(), zone);
  return (
    <nav className="mo-tabs" aria-label="Money">
      <NavLink to={paths.money} end>
        Invoices
      </NavLink>
      <NavLink to={paths.cash}>Cash</NavLink>
      <NavLink to={paths.moneyDay(today)}>Day’s close</NavLink>
    </nav>
  );
}
