import { useState } from 'react';
import { v4 as uuid } from 'uuid';
import type { CashHolderDto } from '@driprail/shared/contracts/cash.contract';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { money, parseMoney } from '../../../lib/format.ts';
import { useCountCash } from '../api/cash.queries.ts';

/** What a person hands in, counted. Over or short is said before it is noted. */
export function CountForm({
  holder,
  personId,
  onDone,
}: {
  holder: CashHolderDto;
  personId: string;
  onDone: () => void;
}) {
  const count = useCountCash();
  const [key] = useState(() => uuid());
  const [counted, setCounted] = useState('');
  const [note, setNote] = useState('');
  const [unread, setUnread] = useState<Record<string, string>>({});
  const fields = { ...fieldsOf(count.error), ...unread };
  const cents = parseMoney(counted);
  const over = cents === null || cents < 0 ? null : cents - holder.cents;
  const submit = () => {
    const faults = {
      ...(over === null && { countedCents: 'Give what was counted, like 85.00; 0 if nothing was handed in.' }),
      ...(over !== null &&
        over !== 0 &&
        note.trim() === '' && { note: `Say what explains that it is ${overWords(over)}.` }),
    };
    setUnread(faults);
    if (Object.keys(faults).length > 0 || count.isPending) return;
    const paymentIds = holder.payments.map(({ id }) => id);
    count.mutate({ key, personId, paymentIds, countedCents: cents ?? 0, note }, { onSuccess: onDone });
  };
  return (
    <form
      className="bl-task"
      aria-label={`Count the cash of ${holder.name}`}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <h3 className="sec">
        Count <span>{money(holder.cents)} should be there</span>
      </h3>
      <div className="bl-fields">
        <TextField
          label="Counted"
          inputMode="decimal"
          autoComplete="off"
          value={counted}
          error={fields['countedCents']}
          onChange={(event) => setCounted(event.target.value)}
        />
        <TextField
          label="Note"
          value={note}
          maxLength={300}
          error={fields['note']}
          onChange={(event) => setNote(event.target.value)}
        />
      </div>
      <p className="bl-result" role="status">
        {over === null ? 'Type what is in the hand.' : over === 0 ? 'It is right.' : `It is ${overWords(over)}.`}
      </p>
      <p className="caution">
        <b>Caution.</b> Over and short are noted here and never touch anybody’s pay. Whether a shortage may be charged
        to a worker at all is a question of law, and usually it may not.
      </p>
      <FormFault error={count.error} fields={fields} />
      <div className="bl-foot">
        <Button type="submit" look="main" isBusy={count.isPending}>
          Note the count
        </Button>
      </div>
    </form>
  );
}

export function overWords(over: number): string {
  return `${money(Math.abs(over))} ${over > 0 ? 'over' : 'short'}`;
}
