import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockRequestDto, EntrySpan } from '@driprail/shared/contracts/hours.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { TextField } from '../../../components/field.tsx';
import { useFormats } from '../../../lib/format.ts';
import { ownRequestsQuery, ownWeekQuery, useDecideChange, useSayHours } from '../api/own-hours.queries.ts';

/** What waits for an answer about one's hours, and one's word on the last week's. */
export function OwnHours({ today, personId }: { today: string; personId: string }) {
  const requests = useQuery(ownRequestsQuery);
  const own =
    requests.data?.requests.filter((request) => request.personId === personId && request.state === 'open') ?? [];
  return (
    <>
      {own.map((request) => (
        <OpenRequest key={request.id} request={request} />
      ))}
      <WeekWord day={addDays(today, -7)} personId={personId} />
    </>
  );
}

function OpenRequest({ request }: { request: ClockRequestDto }) {
  const words = useSpanWords();
  const decide = useDecideChange();
  const [answer, setAnswer] = useState('');
  return (
    <section className="caution" aria-label="Change of hours">
      <p>
        <b>{request.direction === 'proposed' ? `${request.by} proposes` : 'You asked for'}</b> {words(request.after)}
        {request.before ? `, instead of ${words(request.before)}` : ''}. {request.reason}
      </p>
      {request.isMine ? (
        <>
          <TextField
            className="my-2"
            label="If not, what was it"
            value={answer}
            onChange={(event) => setAnswer(event.target.value)}
          />
          <div className="grid grid-cols-2 gap-2">
            <button
              type="button"
              className="btn"
              disabled={decide.isPending}
              onClick={() => decide.mutate({ id: request.id, isAgreed: false, answer })}
            >
              Not so
            </button>
            <button
              type="button"
              className="btn seal"
              disabled={decide.isPending}
              onClick={() => decide.mutate({ id: request.id, isAgreed: true })}
            >
              That is right
            </button>
          </div>
          {decide.error ? <p className="tape mt-2">{decide.error.message}</p> : null}
        </>
      ) : (
        <p className="t-2">Waits for dispatch.</p>
      )}
    </section>
  );
}

function WeekWord({ day, personId }: { day: string; personId: string }) {
  const week = useQuery(ownWeekQuery(day));
  const say = useSayHours(day);
  const [isAsking, setAsking] = useState(false);
  const [note, setNote] = useState('');
  const word = week.data?.words.find((one) => one.personId === personId);
  if (!week.data || !word) return null;
  const span = `${formatDay(week.data.startsOn)} to ${formatDay(week.data.endsOn)}`;
  return (
    <section className="mb-4" aria-label="Last week’s hours">
      <h2 className="sec">
        Last week’s hours <span>{span}</span>
      </h2>
      <p className="py-2">
        {word.isRight === null
          ? 'Nothing said yet.'
          : word.isRight
            ? `Right, said ${word.by ?? ''}.`
            : `Not right: ${word.note}`}
      </p>
      {isAsking ? (
        <TextField
          label="What is not right"
          value={note}
          error={say.error?.message}
          onChange={(event) => setNote(event.target.value)}
        />
      ) : null}
      <div className="grid grid-cols-2 gap-2 mt-2">
        <button
          type="button"
          className="btn"
          disabled={say.isPending || (isAsking && note.trim() === '')}
          onClick={() =>
            isAsking ? say.mutate({ isRight: false, note }, { onSuccess: () => setAsking(false) }) : setAsking(true)
          }
        >
          {isAsking ? 'Tell dispatch' : 'Not right'}
        </button>
        <button
          type="button"
          className="btn seal"
          disabled={say.isPending}
          onClick={() => say.mutate({ isRight: true }, { onSuccess: () => setAsking(false) })}
        >
          My hours are right
        </button>
      </div>
    </section>
  );
}

function useSpanWords() {
  const format = useFormats();
  return ({ kind, startedAt, endedAt }: EntrySpan) => {
    const when = endedAt ? format.span(startedAt, endedAt) : `from ${format.clock(startedAt)}, still running`;
    return `${clockKindNames[kind].toLowerCase()} ${formatDay(dayOf(startedAt, format.zone))}, ${when}`;
  };
}
