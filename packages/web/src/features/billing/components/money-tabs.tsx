import { Link, NavLink, useLocation } from 'react-router';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { serverNow } from '../../../lib/device-clock.ts';
import { useFormats } from '../../../lib/format.ts';

/** The three papers of the Money page. */
export function MoneyTabs() {
  const { zone } = useFormats();
  const { pathname } = useLocation();
  const today = dayOf(serverNow().toISOString(), zone);
  return (
    <nav className="mo-tabs" aria-label="Money">
      <NavLink to={paths.money} end>
        Invoices
      </NavLink>
      <NavLink to={paths.cash}>Cash</NavLink>
      <Link to={paths.moneyDay(today)} aria-current={pathname.startsWith(paths.moneyDay('')) ? 'page' : undefined}>
        Day’s close
      </Link>
    </nav>
  );
}
