import { useAbility } from '@casl/react';
import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { messageViews } from '@driprail/shared/contracts/messages.contract';
import type { MessageView } from '@driprail/shared/contracts/messages.contract';
import { paths } from '../../../app/paths.ts';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { messagesQuery } from '../api/messages.queries.ts';
import { EnquiryRow } from '../components/enquiry-row.tsx';
import { MessageActs } from '../components/message-acts.tsx';
import { MessageRow } from '../components/message-row.tsx';
import '../components/messages.css';

const viewNames: Record<MessageView, string> = {
  open: 'Waiting',
  sent: 'Sent',
  dead: 'Not delivered',
  dropped: 'Dropped',
};
const emptyWords: Record<MessageView, string> = {
  open: 'Nothing waits to go out.',
  sent: 'Nothing was sent yet. A mail goes out when a job is booked with an arrival window.',
  dead: 'Every message was delivered.',
  dropped: 'Nothing was dropped.',
};

/** What customers wrote and nobody answered, and every message by how it stands. */
export function MessagesPage() {
  const [search, setSearch] = useSearchParams();
  const show = messageViews.find((one) => one === search.get('show')) ?? 'open';
  const isOwner = useAbility<AppAbility>().can('update', 'Settings');
  const list = useQuery(messagesQuery(show));
  const counts = list.data?.counts;
  return (
    <>
      <PageHead
        title="Messages"
        above="To customers, and what comes back"
        sums={[
          { label: 'To answer', value: list.data?.enquiries.length ?? '–' },
          { label: 'Not delivered', value: counts?.dead ?? '–' },
        ]}
        actions={
          isOwner ? (
            <Link className="btn" to={paths.messageSettings}>
              Words and hours
            </Link>
          ) : null
        }
      />
      <RailPage>
        <div className="hung ms-page">
          <Loaded query={list} what="the messages">
            {({ messages, enquiries }) => (
              <>
                {enquiries.length > 0 ? (
                  <section aria-label="To answer" className="mb-6">
                    <h2 className="sec">To answer</h2>
                    <ul className="ms-list">
                      {enquiries.map((enquiry) => (
                        <EnquiryRow
                          key={enquiry.id}
                          enquiry={enquiry}
                          who={<Who id={enquiry.customerId} name={enquiry.customerName} />}
                        />
                      ))}
                    </ul>
                  </section>
                ) : null}
                <div className="ms-by" role="group" aria-label="Which messages">
                  {messageViews.map((one) => (
                    <button
                      key={one}
                      type="button"
                      aria-pressed={show === one}
                      onClick={() => setSearch({ show: one }, { replace: true })}
                    >
                      {viewNames[one]} {counts?.[one] ?? ''}
                    </button>
                  ))}
                </div>
                {messages.length === 0 ? <Empty>{emptyWords[show]}</Empty> : null}
                <ul className="ms-list" aria-label={viewNames[show]}>
                  {messages.map((message) => (
                    <MessageRow
                      key={message.id}
                      message={message}
                      who={<Who id={message.customerId} name={message.customerName} />}
                      acts={<MessageActs message={message} />}
                    />
                  ))}
                </ul>
              </>
            )}
          </Loaded>
        </div>
      </RailPage>
    </>
  );
}

function Who({ id, name }: { id: string | null; name: string }) {
  if (!id) return <span className="ms-who">A number nobody is known by</span>;
  return (
    <Link className="ms-who" to={paths.customer(id)} dir="auto">
      {name}
    </Link>
  );
}
