import { useDeferredValue, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { sizeClassNames } from '@driprail/shared/contracts/fields';
import { progressNames } from '@driprail/shared/domain/board/progress';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';
import { mapLink } from '../../../lib/map-link.ts';
import { customerQuery, customersQuery } from '../api/customers.queries.ts';
import { CustomerForm } from '../components/customer-form.tsx';

/** Households and fleets: found by any part of name, phone, plate or address. */
export function CustomersPage() {
  const { id } = useParams();
  const navigate = useNavigate();
  const [find, setFind] = useState('');
  const [editing, setEditing] = useState<CustomerDto | 'new' | null>(null);
  const list = useQuery(customersQuery(useDeferredValue(find.trim())));
  return (
    <>
      <PageHead
        title="Customers"
        above="Households and fleets"
        sums={[{ label: find.trim() ? 'Found' : 'In all', value: list.data?.total ?? '–' }]}
        actions={
          <Button look="main" onClick={() => setEditing('new')}>
            <Icon name="plus" /> New customer
          </Button>
        }
      />
      <RailPage>
        <div className="beside">
          <section aria-label="List">
            <input
              className="inp mb-2 max-w-[410px]"
              type="search"
              placeholder="Find: name, street, phone, plate"
              aria-label="Find customers"
              value={find}
              onChange={(event) => setFind(event.target.value)}
            />
            <Loaded query={list} what="the customers">
              {({ customers, total }) => (
                <>
                  <ul className="rows">
                    {customers.map((customer) => (
                      <li key={customer.id}>
                        <Link to={paths.customer(customer.id)} aria-current={customer.id === id ? 'true' : undefined}>
                          <b>{customer.name}</b>
                          <small>{customer.phone}</small>
                          <small>
                            {customer.addresses[0]?.area || customer.addresses[0]?.line}.{' '}
                            {customer.vehicles.length === 1
                              ? sizeClassNames[customer.vehicles[0]?.sizeClass ?? 'sedan']
                              : `${customer.vehicles.length} vehicles`}
                          </small>
                        </Link>
                      </li>
                    ))}
                  </ul>
                  {customers.length === 0 ? (
                    <Empty>
                      {find
                        ? `Nobody found for “${find}”.`
                        : 'No customers yet. Add the first, or bring in a list with npm run import.'}
                    </Empty>
                  ) : null}
                  {total > customers.length ? (
                    <Empty>
                      The first {customers.length} of {total}. Narrow the search to see others.
                    </Empty>
                  ) : null}
                </>
              )}
            </Loaded>
          </section>
          {id ? (
            <CustomerSheet id={id} onEdit={setEditing} />
          ) : (
            <p className="empty max-[900px]:hidden">Choose a customer to see addresses, vehicles and past visits.</p>
          )}
        </div>
      </RailPage>
      {editing ? (
        <Sheet title={editing === 'new' ? 'New customer' : editing.name} onClose={() => setEditing(null)} width={860}>
          <CustomerForm
            customer={editing === 'new' ? null : editing}
            onCancel={() => setEditing(null)}
            onSaved={(customer) => {
              setEditing(null);
              void navigate(paths.customer(customer.id));
            }}
          />
        </Sheet>
      ) : null}
    </>
  );
}

function CustomerSheet({ id, onEdit }: { id: string; onEdit: (customer: CustomerDto) => void }) {
  const format = useFormats();
  const one = useQuery(customerQuery(id));
  return (
    <section className="hung p-5 max-[900px]:order-first" aria-label="Customer">
      <Loaded query={one} what="the customer">
        {({ customer, history }) => (
          <>
            <header className="flex flex-wrap items-end justify-between gap-x-6 gap-y-2 mb-4">
              <div>
                <h2 className="t-hang text-[44px] leading-[42px]">{customer.name}</h2>
                <p className="t-2">
                  {customer.phone ? <a href={`tel:${customer.phone}`}>{customer.phone}</a> : 'No phone'}
                  {customer.email ? (
                    <>
                      , <a href={`mailto:${customer.email}`}>{customer.email}</a>
                    </>
                  ) : null}
                </p>
              </div>
              <Button onClick={() => onEdit(customer)}>
                <Icon name="pen" /> Edit
              </Button>
            </header>
            <h3 className="sec">Addresses</h3>
            <div className="grid grid-cols-2 gap-x-8 max-[900px]:grid-cols-1">
              {customer.addresses.map((address) => (
                <p key={address.id} className="py-2">
                  <b>{address.area || 'Address'}</b> {address.line}, {address.city}{' '}
                  <a href={mapLink({ ...address, address: address.line })}>Map</a>
                  <br />
                  <span className="t-2">
                    {[
                      address.gateCode ? 'Gate code kept' : '',
                      address.hasWater ? 'Spigot' : 'No spigot',
                      address.hasPower ? 'Outlet' : 'No outlet',
                      address.accessNotes,
                    ]
                      .filter(Boolean)
                      .join('. ')}
                  </span>
                </p>
              ))}
            </div>
            <h3 className="sec mt-4">Vehicles</h3>
            <div className="grid grid-cols-3 gap-x-6 max-[900px]:grid-cols-1">
              {customer.vehicles.map((vehicle) => (
                <p key={vehicle.id} className="py-2">
                  <b>
                    {vehicle.label}
                    {vehicle.color ? `, ${vehicle.color}` : ''}
                  </b>
                  <br />
                  <span className="t-2">
                    {sizeClassNames[vehicle.sizeClass]}
                    {vehicle.plate ? `, plate ${vehicle.plate}` : ''}
                    {vehicle.notes ? `. ${vehicle.notes}` : ''}
                  </span>
                </p>
              ))}
              {customer.vehicles.length === 0 ? <Empty>No vehicles on record.</Empty> : null}
            </div>
            {customer.notes ? (
              <>
                <h3 className="sec mt-4">Notes</h3>
                <p className="whitespace-pre-wrap py-2">{customer.notes}</p>
              </>
            ) : null}
            <h3 className="sec mt-4">
              Jobs <span>{history.length} in all</span>
            </h3>
            {history.length === 0 ? <Empty>No jobs yet.</Empty> : null}
            <table className="grid-t">
              <tbody>
                {history.map((job) => (
                  <tr key={job.jobId}>
                    <td className="whitespace-nowrap">
                      {job.on ? formatDate(dayOf(job.on, format.zone)) : 'No date'}
                      <br />
                      <span className="t-2">
                        {job.on ? (
                          <Link to={`${paths.boardDay(dayOf(job.on, format.zone))}?job=${job.jobId}`}>
                            job {job.jobNumber}
                          </Link>
                        ) : (
                          `job ${job.jobNumber}`
                        )}
                      </span>
                    </td>
                    <td>
                      <b>{job.services}</b>
                      <br />
                      <span className="t-2">{progressNames[job.progress as Progress]}</span>
                    </td>
                    <td className="r t-fig">{money(job.totalCents)}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          </>
        )}
      </Loaded>
    </section>
  );
}
