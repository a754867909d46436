import type { CustomerData } from '@driprail/shared/contracts/customers-data.contract';
import { progressNames } from '@driprail/shared/domain/board/progress';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { photoMomentNames, photoViewNames } from '@driprail/shared/domain/walk-round/views';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { money, useFormats } from '../../../lib/format.ts';

/** Every job with what was ordered, done and paid. */
export function DataJobs({ jobs }: Pick<CustomerData, 'jobs'>) {
  const { zone, span } = useFormats();
  const on = (instant: string) => formatDate(dayOf(instant, zone));
  return jobs.map((job) => (
    <section key={job.number} className="cu-data-job">
      <h3>Job {job.number}</h3>
      <p>
        Booked {on(job.bookedAt)}, {job.place}
      </p>
      {job.notes ? <p dir="auto">{job.notes}</p> : null}
      <table className="grid-t">
        <tbody>
          {job.lines.map((line, index) => (
            <tr key={index}>
              <td>
                {line.service}
                {line.vehicle ? `, ${line.vehicle}` : ''}
              </td>
              <td className="r t-fig">{money(line.priceCents)}</td>
            </tr>
          ))}
          {job.discountCents > 0 ? (
            <tr>
              <td>Discount</td>
              <td className="r t-fig">{money(-job.discountCents)}</td>
            </tr>
          ) : null}
        </tbody>
      </table>
      <ul>
        {job.visits.map((visit, index) => (
          <li key={index}>
            {visit.from && visit.to ? `${on(visit.from)}, ${span(visit.from, visit.to)}` : 'No time yet'}:{' '}
            {progressNames[visit.progress as Progress]}
          </li>
        ))}
        {job.invoices.map(({ number, issuedAt, totalCents }) => (
          <li key={number}>
            Invoice {number}, {on(issuedAt)}: {money(totalCents)}
          </li>
        ))}
        {job.payments.map(({ at, method, amountCents }) => (
          <li key={at}>
            Paid {on(at)}, {method}: {money(amountCents)}
          </li>
        ))}
        {job.tips.map(({ at, amountCents }) => (
          <li key={at}>
            Tip {on(at)}: {money(amountCents)}
          </li>
        ))}
        {job.photos.map(({ id, takenAt, view, moment }) => (
          <li key={id}>
            <a href={`/api/photos/${id}`}>
              Photo {on(takenAt)}, {photoViewNames[view as keyof typeof photoViewNames].toLowerCase()},{' '}
              {photoMomentNames[moment as keyof typeof photoMomentNames].toLowerCase()}
            </a>
          </li>
        ))}
      </ul>
    </section>
  ));
}
