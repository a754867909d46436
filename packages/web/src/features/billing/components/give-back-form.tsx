import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { paymentMethodNames } from '@driprail/shared/contracts/bill.dto';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { Picks } from '../../../components/picks.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { money, useFormats } from '../../../lib/format.ts';
import { refundReasonsQuery, useGiveBack } from '../api/money.queries.ts';
import { goesBack, readCredit } from './credit-draft.ts';
import { GiveBackLines } from './give-back-lines.tsx';
import { backButton, backModes, backWords, orderOf } from './give-back-order.ts';
import type { BackMode } from './give-back-order.ts';

const modeNames: Record<BackMode, string> = {
  lines: 'Lines of the invoice',
  over: 'What was overpaid',
  mistake: 'A payment recorded by mistake',
};

/** The owner gives money back: by lines with their tax, what was overpaid, or a payment that never was. */
export function GiveBackForm({ bill, onDone }: { bill: BillDto; onDone: () => void }) {
  const { zone } = useFormats();
  const give = useGiveBack();
  const reasons = useQuery(refundReasonsQuery);
  const modes = backModes(bill);
  const [key] = useState(() => uuid());
  const [mode, setMode] = useState<BackMode>(modes[0] ?? 'lines');
  const [paymentId, setPaymentId] = useState('');
  const [texts, setTexts] = useState<Record<string, string>>({});
  const [reasonId, setReasonId] = useState('');
  const [note, setNote] = useState('');
  const [unread, setUnread] = useState<Record<string, string>>({});

  const choices = bill.payments.filter(
    (payment) =>
      payment.amountCents > payment.refundedCents &&
      (mode !== 'mistake' || (payment.method !== 'card' && payment.refundedCents === 0)),
  );
  const payment = choices.find(({ id }) => id === paymentId) ?? choices.at(-1) ?? null;
  const credit = readCredit(bill, mode === 'lines' ? texts : {});
  const creditCents = credit.amounts?.totalCents ?? 0;
  const backCents = mode === 'mistake' ? (payment?.amountCents ?? 0) : goesBack(bill, creditCents, payment);
  const draft = { mode, bill, payment, credit, backCents };
  const fields = { ...fieldsOf(give.error), ...unread };
  const submit = () => {
    const faults = {
      ...(note.trim() === '' && { note: 'Say why.' }),
      ...(mode === 'lines' && credit.picks.length === 0 && { lines: 'Give an amount at a line to credit.' }),
    };
    setUnread(faults);
    if (Object.keys(faults).length > 0 || Object.keys(credit.faults).length > 0 || give.isPending) return;
    give.mutate(orderOf(draft, { key, reasonId: reasonId || null, note }), { onSuccess: onDone });
  };
  if (modes.length === 0)
    return (
      <section className="bl-task">
        <p>Nothing was billed or received that could go back.</p>
        <div className="bl-foot">
          <Button onClick={onDone}>Close</Button>
        </div>
      </section>
    );
  return (
    <form
      className="bl-task"
      aria-label="Give back"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <h3 className="sec">Give back</h3>
      <Picks
        className="bl-picks"
        options={modes}
        value={mode}
        nameOf={(one) => modeNames[one]}
        onPick={(one) => {
          setMode(one);
          setUnread({});
        }}
      />
      {mode === 'lines' ? (
        <GiveBackLines
          bill={bill}
          texts={texts}
          credit={credit}
          error={fields['lines']}
          onChange={(next) => {
            setTexts(next);
            setUnread({});
          }}
        />
      ) : null}
      <div className="bl-fields">
        {choices.length > 0 ? (
          <SelectField
            label={mode === 'mistake' ? 'Which payment' : 'Out of which payment'}
            value={payment?.id ?? ''}
            onChange={(event) => setPaymentId(event.target.value)}
          >
            {choices.map((one) => (
              <option key={one.id} value={one.id}>
                {paymentMethodNames[one.method]} {money(one.amountCents - one.refundedCents)},{' '}
                {formatDay(dayOf(one.receivedAt, zone))}
              </option>
            ))}
          </SelectField>
        ) : null}
        {mode === 'lines' ? (
          <SelectField
            label="Reason"
            value={reasonId}
            error={fields['reasonId']}
            hint="Reasons, and what each does to commission, are kept under Rates and pay rules."
            onChange={(event) => setReasonId(event.target.value)}
          >
            <option value="">None of the list</option>
            <NamedOptions of={reasons.data?.refundReasons ?? []} />
          </SelectField>
        ) : null}
        <TextField
          className="is-wide"
          label={mode === 'mistake' ? 'How it came about' : 'Why, as the credit note says it'}
          value={note}
          maxLength={300}
          error={fields['note']}
          onChange={(event) => setNote(event.target.value)}
        />
      </div>
      <p className="bl-result" role="status" aria-label="What this does">
        {backWords(draft)}
      </p>
      {fields['amountCents'] ? (
        <p className="tape" role="alert">
          {fields['amountCents']}
        </p>
      ) : null}
      <FormFault error={give.error} fields={fields} />
      <div className="bl-foot">
        <Button onClick={onDone}>Leave</Button>
        <Button type="submit" look="main" isBusy={give.isPending} disabled={mode === 'over' && backCents === 0}>
          {backButton(draft)}
        </Button>
      </div>
    </form>
  );
}
