import type { ReactNode } from 'react';
import { useAbility } from '@casl/react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { tag } from '@driprail/shared/authz/ability';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Loaded } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';
import { customerQuery } from '../api/customers.queries.ts';
import { RecordAddresses } from './record-addresses.tsx';
import { RecordHistory } from './record-history.tsx';
import { RecordSide } from './record-side.tsx';
import { RecordVehicles } from './record-vehicles.tsx';

interface RecordProps {
  id: string;
  /** What was written to the customer and came back. */
  messages: ReactNode;
  onEdit: (customer: CustomerDto) => void;
  onMerge: (customer: CustomerDto) => void;
  onErase: (customer: CustomerDto) => void;
}

/** One customer's whole record, hung beside the list. */
export function CustomerRecord({ id, messages, onEdit, onMerge, onErase }: RecordProps) {
  const { zone } = useFormats();
  const ability = useAbility<AppAbility>();
  const one = useQuery(customerQuery(id));
  return (
    <article className="hung cu" aria-label="Customer">
      <p className="cu-back">
        <Link to={paths.customers}>
          <Icon name="left" /> All customers
        </Link>
      </p>
      <Loaded query={one} what="the customer">
        {({ customer, mergedName, erasedAt, since, history }) => (
          <>
            {mergedName === null ? null : (
              <p className="cu-merged">
                The record of <b dir="auto">{mergedName}</b> was merged into this one.
              </p>
            )}
            <header>
              <h2 className="t-hang" dir="auto">
                {customer.name}
              </h2>
              <p>
                {[
                  customer.phone ? (
                    <a key="phone" href={`tel:${customer.phone}`}>
                      {customer.phone}
                    </a>
                  ) : null,
                  customer.email ? (
                    <a key="mail" href={`mailto:${encodeURIComponent(customer.email).replace('%40', '@')}`}>
                      {customer.email}
                    </a>
                  ) : null,
                ]
                  .filter((one) => one !== null)
                  .flatMap((one, index) => (index === 0 ? [one] : [', ', one]))}
                {customer.phone || customer.email || erasedAt ? null : 'No phone, no e-mail'}
                <br />
                <span className="t-2">
                  {customer.isCompany ? 'Company, since' : 'Since'} {formatDate(dayOf(since, zone))},{' '}
                  {jobsWords(history)}
                </span>
              </p>
              {erasedAt ? null : (
                <p className="cu-go">
                  {customer.phone ? (
                    <a className="btn" href={`tel:${customer.phone}`}>
                      <Icon name="phone" /> Call
                    </a>
                  ) : null}
                  <Button onClick={() => onEdit(customer)}>
                    <Icon name="pen" /> Edit
                  </Button>
                </p>
              )}
            </header>
            <div>
              {erasedAt ? null : (
                <>
                  <section>
                    <h3 className="sec">Addresses</h3>
                    <RecordAddresses addresses={customer.addresses} />
                  </section>
                  <section>
                    <h3 className="sec">Vehicles</h3>
                    <RecordVehicles vehicles={customer.vehicles} />
                  </section>
                </>
              )}
              <RecordHistory history={history} />
              {erasedAt ? null : messages}
            </div>
            <div>
              {erasedAt ? null : <RecordSide customer={customer} />}
              {erasedAt ? null : (
                <p className="cu-foot">
                  <button type="button" className="link" onClick={() => onMerge(customer)}>
                    Merge with another record
                  </button>
                  <Link to={paths.customerData(customer.id)}>Copy of the data</Link>
                  {ability.can('erase', tag('Customer', { id: customer.id })) ? (
                    <button type="button" className="link" onClick={() => onErase(customer)}>
                      Erase the customer
                    </button>
                  ) : null}
                </p>
              )}
            </div>
          </>
        )}
      </Loaded>
    </article>
  );
}

function jobsWords(history: { totalCents: number; progress: string }[]): string {
  const done = history.filter(({ progress }) => progress === 'done');
  const sum = done.reduce((total, { totalCents }) => total + totalCents, 0);
  const jobs = `${history.length} job${history.length === 1 ? '' : 's'}`;
  return done.length === 0 ? jobs : `${jobs}, ${money(sum)} done`;
}
