import { useQuery } from '@tanstack/react-query';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { channelNames, channels, mayWrite } from '@driprail/shared/domain/customer/consent';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Mark } from '../../../components/icon.tsx';
import { crewQuery } from '../api/customers.queries.ts';

/** What the customer agreed to, whom the customer likes to see, and what is noted. */
export function RecordSide({ customer }: { customer: CustomerDto }) {
  return (
    <>
      <section>
        <h3 className="sec">Consent</h3>
        <ul className="cu-cons">
          {channels.map((channel) => {
            const answer = customer.consents.find((consent) => consent.channel === channel);
            const isOpen = mayWrite(channel, customer.consents);
            return (
              <li key={channel}>
                <i className="check-box" role="img" aria-label={isOpen ? 'Yes' : 'No'}>
                  {isOpen ? <Mark name="m-done" /> : null}
                </i>
                {channelNames[channel]}
                <small>
                  {answer
                    ? `${answer.isGiven ? '' : 'said no, '}${answer.how}, ${formatDate(answer.on)}`
                    : 'never asked'}
                </small>
              </li>
            );
          })}
        </ul>
      </section>
      <PreferredCrew ids={customer.preferredCrew} />
      {customer.tags.length > 0 ? (
        <section>
          <h3 className="sec">Tags</h3>
          <p className="py-1" dir="auto">
            {customer.tags.join(', ')}
          </p>
        </section>
      ) : null}
      <section>
        <h3 className="sec">Notes</h3>
        {customer.isScentFree ? <p className="py-1">No scent</p> : null}
        {customer.ringsFirst ? <p className="py-1">Ring first</p> : null}
        {customer.mustKnow ? (
          <p className="py-1" dir="auto">
            {customer.mustKnow}
          </p>
        ) : null}
        <p className="cu-notes" dir="auto">
          {customer.notes || 'Nothing noted.'}
        </p>
      </section>
    </>
  );
}

function PreferredCrew({ ids }: { ids: string[] }) {
  const people = useQuery({ ...crewQuery, enabled: ids.length > 0 });
  if (ids.length === 0) return null;
  const names = ids.map((id) => people.data?.people.find((person) => person.id === id)?.name ?? '');
  return (
    <section>
      <h3 className="sec">Preferred crew</h3>
      <p className="py-1">{names.filter(Boolean).join(', then ') || '–'}</p>
    </section>
  );
}
