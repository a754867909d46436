import { useDeferredValue, useState } from 'react';
import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { ListedCustomer } from '@driprail/shared/contracts/customers.contract';
import { sizeClassNames } from '@driprail/shared/contracts/fields';
import { progressNames } from '@driprail/shared/domain/board/progress';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { formatDate, formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { useFormats } from '../../../lib/format.ts';
import { customersQuery } from '../api/customers.queries.ts';
import type { CustomerOrder } from '../api/customers.queries.ts';

const orderNames: Record<CustomerOrder, string> = { name: 'By name', visit: 'Last visit' };

/** One box, two orders, and the customers found, more of them on request. */
export function CustomerList({ chosenId, onNew }: { chosenId: string | undefined; onNew: (name: string) => void }) {
  const [find, setFind] = useState('');
  const [by, setBy] = useState<CustomerOrder>('name');
  const list = useInfiniteQuery(customersQuery(useDeferredValue(find.trim()), by));
  const total = list.data?.pages[0]?.total ?? null;
  return (
    <section aria-label="List" className="cu-list">
      <div className="cu-find">
        <input
          className="inp"
          type="search"
          placeholder="Name, street, phone, plate, VIN, tag"
          aria-label="Find customers"
          value={find}
          onChange={(event) => setFind(event.target.value)}
        />
        <Button onClick={() => onNew(find.trim())}>
          <Icon name="plus" /> New
        </Button>
      </div>
      <p className="cu-by">
        {(['name', 'visit'] as const).map((order) => (
          <button key={order} type="button" aria-pressed={by === order} onClick={() => setBy(order)}>
            {orderNames[order]}
          </button>
        ))}
        <span role="status">{total === null ? '' : find.trim() ? `${total} found` : `${total} in all`}</span>
      </p>
      <Loaded query={list} what="the customers">
        {({ pages }) => {
          const customers = pages.flatMap((page) => page.customers);
          return (
            <>
              <ul className="rows">
                {customers.map((customer) => (
                  <li key={customer.id}>
                    <Row customer={customer} isChosen={customer.id === chosenId} />
                  </li>
                ))}
              </ul>
              {customers.length > 0 ? null : find.trim() ? (
                <Empty>
                  Nobody found for “{find.trim()}”.{' '}
                  <button type="button" className="link" onClick={() => onNew(find.trim())}>
                    Add a customer of that name
                  </button>
                </Empty>
              ) : (
                <Empty>No customers yet. Add the first, or bring in a list with npm run import.</Empty>
              )}
              {list.hasNextPage ? (
                <Button className="mt-3" isBusy={list.isFetchingNextPage} onClick={() => void list.fetchNextPage()}>
                  Show more of {total}
                </Button>
              ) : null}
            </>
          );
        }}
      </Loaded>
    </section>
  );
}

function Row({ customer, isChosen }: { customer: ListedCustomer; isChosen: boolean }) {
  const [address] = customer.addresses;
  const [vehicle, ...others] = customer.vehicles;
  return (
    <Link to={paths.customer(customer.id)} aria-current={isChosen ? 'true' : undefined}>
      <b dir="auto">{customer.name}</b>
      <small>
        <StandingWords standing={customer.standing} />
      </small>
      <small className="truncate">
        {[
          address?.area || address?.line,
          !vehicle ? '' : others.length > 0 ? `${others.length + 1} vehicles` : sizeClassNames[vehicle.sizeClass],
        ]
          .filter(Boolean)
          .join('. ')}
      </small>
      <small>{customer.phone}</small>
    </Link>
  );
}

function StandingWords({ standing }: Pick<ListedCustomer, 'standing'>) {
  const format = useFormats();
  if (!standing) return 'no job yet';
  if (standing.at === null) return 'not placed';
  const progress = progressNames[standing.progress as Progress].toLowerCase();
  const day = dayOf(standing.at, format.zone);
  const today = dayOf(serverNow().toISOString(), format.zone);
  if (day === today) return `today, ${standing.progress === 'placed' ? format.clock(standing.at) : progress}`;
  return day > today
    ? `${formatDay(day)}, ${format.clock(standing.at)}`
    : day.slice(0, 4) === today.slice(0, 4)
      ? formatDay(day)
      : formatDate(day);
}
