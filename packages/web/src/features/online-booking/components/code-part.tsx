import { useState } from 'react';
import { formatClock } from '@driprail/shared/domain/time/format';
import { TextField } from '../../../components/field.tsx';
import { ApiError } from '../../../lib/call.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { useBook } from '../api/online-booking.queries.ts';
import { emptyDraft } from './book-draft.ts';
import { StepFoot } from './book-step.tsx';
import type { PartProps } from './car-and-work.tsx';
import { HoldFault } from './hold-fault.tsx';

/** The code from the mail: only with it is anything booked. */
export function CodePart({ menu, draft, cents, set, onTime, onYou }: Ways) {
  const [code, setCode] = useState('');
  const book = useBook();
  const fields = fieldsOf(book.error);
  const { hold } = draft;
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (book.isPending || !hold) return;
        // What was filled in is done with; the answer stays for this tab.
        book.mutate({ id: hold.id, code }, { onSuccess: ({ booked }) => set({ ...emptyDraft, booked }) });
      }}
    >
      <p className="pb-3">
        A mail with six digits is on its way to <b>{draft.email}</b>.
        {hold ? ` The time is yours until ${formatClock(hold.expiresAt, menu.zone, menu.clock)}.` : ''}
      </p>
      <TextField
        label="Code from the mail"
        inputMode="numeric"
        autoComplete="one-time-code"
        maxLength={6}
        value={code}
        error={fields['code']}
        onChange={(event) => setCode(event.target.value.replace(/\D/g, ''))}
      />
      <p className="py-2">
        No mail? Look among unwanted mail, or{' '}
        <button type="button" className="link" onClick={onYou}>
          check the address and send another
        </button>
        .
      </p>
      {book.error instanceof ApiError && Object.keys(fields).length === 0 ? (
        <HoldFault error={book.error} onTime={onTime} />
      ) : null}
      <StepFoot cents={cents} label="Book it" isBusy={book.isPending} isOff={code.length < 6} />
    </form>
  );
}

type Ways = Omit<PartProps, 'onNext'> & { onTime: () => void; onYou: () => void };
