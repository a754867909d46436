import { useQuery } from '@tanstack/react-query';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Loaded } from '../../../components/states.tsx';
import { useFormats } from '../../../lib/format.ts';
import { customerMessagesQuery } from '../api/messages.queries.ts';
import { EnquiryRow } from './enquiry-row.tsx';
import { MessageActs } from './message-acts.tsx';
import { MessageRow } from './message-row.tsx';
import './messages.css';

const SHOWN = 12;

/** All that was written to one customer and came back. */
export function CustomerMessages({ customerId }: { customerId: string }) {
  const { zone } = useFormats();
  const log = useQuery(customerMessagesQuery(customerId));
  const on = (instant: string) => formatDate(dayOf(instant, zone));
  return (
    <section>
      <h3 className="sec">Messages</h3>
      <Loaded query={log} what="the messages">
        {({ messages, enquiries, stops, bounces }) => (
          <>
            {stops.map(({ what, at }) => (
              <p key={what} className="ms-note">
                The customer stopped {what} on {on(at)}.
              </p>
            ))}
            {bounces.map(({ address, reason, at }) => (
              <p key={address} className="tape my-2">
                <b>Mail to {address} came back</b> on {on(at)}
                {reason ? `: ${reason}` : ''}. Ask for another address.
              </p>
            ))}
            {messages.length + enquiries.length === 0 ? <p className="py-1 t-2">Nothing was written yet.</p> : null}
            <ul className="ms-list">
              {enquiries.map((enquiry) => (
                <EnquiryRow key={enquiry.id} enquiry={enquiry} />
              ))}
              {messages.slice(0, SHOWN).map((message) => (
                <MessageRow key={message.id} message={message} acts={<MessageActs message={message} />} />
              ))}
            </ul>
            {messages.length > SHOWN ? (
              <details className="ms-words">
                <summary>{messages.length - SHOWN} earlier ones</summary>
                <ul className="ms-list">
                  {messages.slice(SHOWN).map((message) => (
                    <MessageRow key={message.id} message={message} />
                  ))}
                </ul>
              </details>
            ) : null}
          </>
        )}
      </Loaded>
    </section>
  );
}
