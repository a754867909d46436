import { useQuery } from '@tanstack/react-query';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import { listLocalMail } from '@driprail/shared/contracts/mail.contract';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { useFormats } from '../../../lib/format.ts';

type Taken = OutputOf<typeof listLocalMail>;

/** What the local fakes took, since no mail server is set. Only on this machine, only for an owner. */
export function LocalMailPage() {
  const mails = useQuery({
    queryKey: ['local-mail'],
    queryFn: ({ signal }) => call(listLocalMail, {}, signal),
    refetchInterval: 5000,
  });
  return (
    <>
      <PageHead title="Local mail" above="No mail server is set: mails and texts stop here" />
      <RailPage>
        <div className="hung p-5 max-w-[760px]">
          <Loaded query={mails} what="the mails">
            {({ mails: list, texts }) =>
              list.length + texts.length === 0 ? (
                <Empty>No mail yet. Invitations, reset links and messages to customers land here.</Empty>
              ) : (
                [...list, ...texts]
                  .toSorted((a, b) => b.at.localeCompare(a.at))
                  .map((one) =>
                    'subject' in one ? <Mail key={one.id} mail={one} /> : <Text key={one.key} text={one} />,
                  )
              )
            }
          </Loaded>
        </div>
      </RailPage>
    </>
  );
}

function Mail({ mail }: { mail: Taken['mails'][number] }) {
  const { clock } = useFormats();
  const { subject, to, at, text, html, calendar } = mail;
  return (
    <article className="border-b border-line py-3">
      <h2 className="sec">
        {subject}
        <span>
          to {to}, {clock(at)}
        </span>
      </h2>
      <p className="whitespace-pre-wrap break-words mt-2">{linked(text)}</p>
      {calendar ? (
        <p className="mt-2">
          <a href={`data:text/calendar;charset=utf-8,${encodeURIComponent(calendar)}`} download="visit.ics">
            visit.ics
          </a>
        </p>
      ) : null}
      {html ? (
        <details className="mt-2">
          <summary>As it looks</summary>
          <iframe
            title={subject}
            sandbox=""
            srcDoc={html}
            className="w-full h-[560px] border border-line-strong mt-2"
          />
        </details>
      ) : null}
    </article>
  );
}

function Text({ text }: { text: Taken['texts'][number] }) {
  const { clock } = useFormats();
  return (
    <article className="border-b border-line py-3">
      <h2 className="sec">
        Text message
        <span>
          to {text.to}, {clock(text.at)}
        </span>
      </h2>
      <p className="whitespace-pre-wrap break-words mt-2">{linked(text.body)}</p>
    </article>
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
