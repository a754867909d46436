import { useState } from 'react';
import { Link } from 'react-router';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { listDue } from '@driprail/shared/contracts/jobs.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { money } from '../../../lib/format.ts';
import { useBookAgain } from '../api/jobs.queries.ts';

type Due = OutputOf<typeof listDue>['due'];

/** What is due, the longest overdue first; the same again is put on Unplaced by two presses. */
export function DueTable({ due, today }: { due: Due; today: string }) {
  const book = useBookAgain();
  const [asked, setAsked] = useState<string | null>(null);
  return (
    <>
      {book.error ? (
        <p className="tape mb-3" role="alert">
          <b>{book.error.message}</b>
        </p>
      ) : null}
      <div className="scroll-x" role="region" aria-label="Due again" tabIndex={0}>
        <table className="grid-t min-w-[860px]">
          <thead>
            <tr>
              <th>Customer</th>
              <th>Car</th>
              <th>Service</th>
              <th>Last done</th>
              <th>Due</th>
              <th className="r">Last price</th>
              <th className="r">Book</th>
            </tr>
          </thead>
          <tbody>
            {due.map((one) => {
              const key = `${one.jobId}/${one.vehicle}/${one.serviceName}`;
              return (
                <tr key={key}>
                  <td>
                    <Link to={paths.customer(one.customerId)}>
                      <b>{one.customerName}</b>
                    </Link>
                    {one.phone ? <span className="block t-2">{one.phone}</span> : null}
                  </td>
                  <td>{one.vehicle}</td>
                  <td>{one.serviceName}</td>
                  <td>{formatDate(one.doneOn)}</td>
                  <td className={one.dueOn < today ? 'font-bold' : ''}>{formatDate(one.dueOn)}</td>
                  <td className="r">{money(one.priceCents)}</td>
                  <td className="r whitespace-nowrap">
                    {asked === key ? (
                      <>
                        <Button look="bare" onClick={() => setAsked(null)}>
                          Not yet
                        </Button>
                        <Button
                          look="main"
                          isBusy={book.isPending}
                          onClick={() => book.mutate(one.jobId, { onSuccess: () => setAsked(null) })}
                        >
                          Put on Unplaced
                        </Button>
                      </>
                    ) : (
                      <Button
                        aria-label={`Same again, ${one.customerName}, ${one.vehicle}`}
                        onClick={() => setAsked(key)}
                      >
                        Same again
                      </Button>
                    )}
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
    </>
  );
}
