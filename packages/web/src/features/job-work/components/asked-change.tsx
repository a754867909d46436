import { useState } from 'react';
import type { JobChangeDto } from '@driprail/shared/contracts/job-work.contract';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { useFormats } from '../../../lib/format.ts';
import { useAnswerChange } from '../api/open-work.queries.ts';
import { signed, timeWords } from './change-row.tsx';

/** A change that the crew asks for: accept it, or decline it, and then it stays as a quote. */
export function AskedChange({ change }: { change: JobChangeDto }) {
  const format = useFormats();
  const answer = useAnswerChange();
  const [note, setNote] = useState('');
  const send = (isAccepted: boolean) => answer.mutate({ id: change.id, isAccepted, note });
  return (
    <div className="tape vw-asked" role="group" aria-label={`Asked: ${change.words}`}>
      <p>
        <b>
          {change.by} asks: {change.words}.
        </b>{' '}
        {signed(change.priceDifferenceCents)}, {timeWords(change.minutesDifference)}, through about{' '}
        {format.clock(change.finishAt)}. {change.reason}.{' '}
        {change.saidYesBy ? `${change.saidYesBy} said yes.` : 'The customer said yes in person.'}
        {change.isBoardNotAsked ? ' Board not asked: the crew had no signal.' : ''}
      </p>
      {change.hindrances.map((one) => (
        <p key={one.code}>{one.message}</p>
      ))}
      <TextField
        label="Note to the crew"
        value={note}
        maxLength={300}
        onChange={(event) => setNote(event.target.value)}
        error={answer.error?.message}
      />
      <div className="flex flex-wrap gap-2 mt-2">
        <Button look="main" isBusy={answer.isPending} onClick={() => send(true)}>
          Accept the change
        </Button>
        <Button isBusy={answer.isPending} onClick={() => send(false)}>
          Decline, keep as quote
        </Button>
      </div>
    </div>
  );
}
