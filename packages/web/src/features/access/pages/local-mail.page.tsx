import { useQuery } from '@tanstack/react-query';
import { listLocalMail } from '@driprail/shared/contracts/mail.contract';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { useFormats } from '../../../lib/format.ts';

/** What the local mail fake took, since no mail server is set. Only on this machine, only for an owner. */
export function LocalMailPage() {
  const format = useFormats();
  const mails = useQuery({
    queryKey: ['local-mail'],
    queryFn: ({ signal }) => call(listLocalMail, {}, signal),
    refetchInterval: 5000,
  });
  return (
    <>
      <PageHead title="Local mail" above="No mail server is set: mails stop here" />
      <RailPage>
        <div className="hung p-5 max-w-[760px]">
          <Loaded query={mails} what="the mails">
            {({ mails: list }) =>
              list.length === 0 ? (
                <Empty>No mail yet. Invitations and reset links land here.</Empty>
              ) : (
                list.map((mail) => (
                  <article key={mail.id} className="border-b border-line py-3">
                    <h2 className="sec">
                      {mail.subject}
                      <span>
                        to {mail.to}, {format.clock(mail.at)}
                      </span>
                    </h2>
                    <p className="whitespace-pre-wrap break-words mt-2">{linked(mail.text)}</p>
                  </article>
                ))
              )
            }
          </Loaded>
        </div>
      </RailPage>
    </>
  );
}

function linked(text: string) {
  return text.split(/(https?:\/\/\S+)/).map((part, index) =>
    part.startsWith('http') ? (
      <a key={index} href={part}>
        {part}
      </a>
    ) : (
      part
    ),
  );
}
