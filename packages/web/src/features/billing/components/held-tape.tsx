import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { money } from '../../../lib/format.ts';
import { heldQuery } from '../api/money.queries.ts';

/** Jobs that were called off after money had come in: nobody finds them among invoices. */
export function HeldTape() {
  const { data } = useQuery(heldQuery);
  if (!data || data.held.length === 0) return null;
  return (
    <p className="tape mb-3">
      <b>Called off, and money is held.</b>{' '}
      {data.held.map((one, index) => (
        <span key={one.jobId}>
          {index > 0 ? ', ' : ''}
          <Link to={`?job=${one.jobId}`}>
            {one.customerName}, job {one.jobNumber}
          </Link>{' '}
          {money(one.cents)}
        </span>
      ))}
      . Give it back, or bill the fee that was agreed to.
    </p>
  );
}
