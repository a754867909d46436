import { useState } from 'react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import { decideClockChange, listClockRequests } from '@driprail/shared/contracts/hours.contract';
import type { ClockRequestDto, EntrySpan } from '@driprail/shared/contracts/hours.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Mark } from '../../../components/icon.tsx';
import { call } from '../../../lib/call.ts';
import { useFormats } from '../../../lib/format.ts';

/** Changes of hours that wait: who asks, when, before and after. Those that others decide are shown too. */
export function HoursRequests() {
  const requests = useQuery({
    queryKey: ['clock', 'requests'],
    queryFn: ({ signal }) => call(listClockRequests, {}, signal),
  });
  const open = requests.data?.requests.filter((request) => request.state === 'open') ?? [];
  if (open.length === 0) return null;
  return (
    <section className="hung p-5 max-w-[1100px] mb-9" aria-label="Changes of hours">
      <h2 className="sec">
        Changes that wait <span>both versions stay on record</span>
      </h2>
      {open.map((request) => (
        <Request key={request.id} request={request} />
      ))}
    </section>
  );
}

function Request({ request }: { request: ClockRequestDto }) {
  const client = useQueryClient();
  const format = useFormats();
  const [answer, setAnswer] = useState('');
  const decide = useMutation({
    mutationFn: (isAgreed: boolean) =>
      call(decideClockChange, { params: { id: request.id }, body: { isAgreed, answer } }),
    onSettled: () => Promise.all(['clock', 'pay', 'board'].map((key) => client.invalidateQueries({ queryKey: [key] }))),
  });
  return (
    <article className="grid grid-cols-[1.1fr_1fr_1fr_auto] gap-x-6 gap-y-2 items-start border-b border-line py-3 max-[900px]:grid-cols-1">
      <p>
        <b>{request.personName}</b> <span className="t-2">{request.reason}</span>
        <br />
        <span className="t-3">
          {request.direction === 'asked' ? 'asked' : `proposed by ${request.by}`}{' '}
          {formatDay(dayOf(request.at, format.zone))}, {format.clock(request.at)}
        </span>
      </p>
      <Version label="As it stands" span={request.before} />
      <Version label="As it would be" span={request.after} isNew />
      {request.isMine ? (
        <div className="grid gap-2">
          <div className="flex gap-2">
            <Button isBusy={decide.isPending} onClick={() => decide.mutate(false)}>
              Refuse
            </Button>
            <Button look="seal" isBusy={decide.isPending} onClick={() => decide.mutate(true)}>
              Agree
            </Button>
          </div>
          <TextField label="Answer, if any" value={answer} onChange={(event) => setAnswer(event.target.value)} />
        </div>
      ) : (
        <p className="t-2">Waits for {request.direction === 'proposed' ? request.personName : 'the owner'}</p>
      )}
      {decide.error ? <p className="tape col-span-full">{decide.error.message}</p> : null}
    </article>
  );
}

function Version({ label, span, isNew = false }: { label: string; span: EntrySpan | null; isNew?: boolean }) {
  const format = useFormats();
  return (
    <p className={isNew ? 'border-2 border-ink rounded-[3px] px-2 py-1' : 'border border-line rounded-[3px] px-2 py-1'}>
      <span className="t-3">{label}</span>
      <br />
      {span ? (
        <>
          <b>{clockKindNames[span.kind]}</b> {formatDay(dayOf(span.startedAt, format.zone))}
          <br />
          {span.endedAt ? (
            format.span(span.startedAt, span.endedAt)
          ) : (
            <>
              <Mark name="m-late" /> from {format.clock(span.startedAt)}, no end
            </>
          )}
        </>
      ) : (
        'Nothing on the clock'
      )}
    </p>
  );
}
