import { useState } from 'react';
import { formatClock } from '@driprail/shared/domain/time/format';
import { CheckField, TextArea, TextField } from '../../../components/field.tsx';
import { ApiError } from '../../../lib/call.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { useSendCode } from '../api/online-booking.queries.ts';
import { StepFoot } from './book-step.tsx';
import type { PartProps } from './car-and-work.tsx';
import { HoldFault } from './hold-fault.tsx';
import { policyWords } from './policy-words.ts';

/** Who books, and the terms; a code then goes to the e-mail address. */
export function YouPart({ menu, draft, cents, set, onNext, onTime }: PartProps & { onTime: () => void }) {
  const [website, setWebsite] = useState('');
  const send = useSendCode();
  const fields = fieldsOf(send.error);
  const text = (name: 'vehicle' | 'name' | 'phone' | 'email') => ({
    value: draft[name],
    error: fields[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) => set({ [name]: event.target.value }),
  });
  const { policy, zone, clock } = menu;
  const isAccepted = draft.accepted === policy.version;
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (send.isPending || !draft.hold) return;
        const { vehicle, name, phone, email, notes, hold } = draft;
        const policyVersion = isAccepted ? policy.version : 0;
        send.mutate(
          { id: hold.id, body: { vehicle, name, phone, email, notes, policyVersion, website } },
          {
            onSuccess: ({ expiresAt }) => {
              set({ hold: { ...hold, expiresAt }, isCodeSent: true });
              onNext();
            },
          },
        );
      }}
    >
      {draft.hold ? (
        <p className="t-2 pb-2">The time is yours until {formatClock(draft.hold.expiresAt, zone, clock)}.</p>
      ) : null}
      <div className="grid gap-3">
        <TextField label="Your name" autoComplete="name" {...text('name')} />
        <TextField label="Phone" type="tel" autoComplete="tel" {...text('phone')} />
        <TextField
          label="E-mail"
          type="email"
          autoComplete="email"
          hint="We send a code there; with it the time is booked."
          {...text('email')}
        />
        <TextField label="The car" placeholder="2019 hatchback, gray" {...text('vehicle')} />
        <TextArea
          label="What we should know"
          rows={3}
          hint="Please write no gate codes or keys here. We ask when we come."
          value={draft.notes}
          error={fields['notes']}
          onChange={(event) => set({ notes: event.target.value })}
        />
        <div className="book-trap" aria-hidden>
          <label>
            Leave this empty
            <input
              tabIndex={-1}
              autoComplete="off"
              name="website"
              value={website}
              onChange={(event) => setWebsite(event.target.value)}
            />
          </label>
        </div>
        <section aria-label="Terms">
          <h3 className="sec">Terms</h3>
          <p className="whitespace-pre-line">{policy.words}</p>
          <p className="pt-1">{policyWords(policy)}</p>
          <CheckField
            label="I accept these terms"
            checked={isAccepted}
            onChange={({ target }) => set({ accepted: target.checked ? policy.version : 0 })}
          />
          {fields['policyVersion'] ? (
            <p className="tape err" role="alert">
              {fields['policyVersion']}
            </p>
          ) : null}
        </section>
      </div>
      {send.error instanceof ApiError && Object.keys(fields).length === 0 ? (
        <HoldFault error={send.error} onTime={onTime} />
      ) : null}
      <StepFoot cents={cents} label="Send the code" isBusy={send.isPending} />
    </form>
  );
}
