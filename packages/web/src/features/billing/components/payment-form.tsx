import { useState } from 'react';
import { v4 as uuid } from 'uuid';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { paymentMethodNames } from '@driprail/shared/contracts/bill.dto';
import { handMethods } from '@driprail/shared/contracts/billing.contract';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { money, parseMoney } from '../../../lib/format.ts';
import { useRecordPayment } from '../api/money.queries.ts';

const referenceNames = { cash: 'Note', check: 'Check number', transfer: 'Reference of the transfer' } as const;

/** Cash, a check or a transfer as it came in at the desk. Pressed twice it is recorded once. */
export function PaymentForm({ bill, onDone }: { bill: BillDto; onDone: () => void }) {
  const record = useRecordPayment(bill.jobId);
  const [key] = useState(() => uuid());
  const [method, setMethod] = useState<(typeof handMethods)[number]>('check');
  const [amount, setAmount] = useState(() => (bill.owedCents / 100).toFixed(2));
  const [tip, setTip] = useState('');
  const [reference, setReference] = useState('');
  const [pressed, setPressed] = useState<{ of: string; deviceAt: string; offsetMs: number } | null>(null);
  const [unread, setUnread] = useState<Record<string, string>>({});
  const fields = { ...fieldsOf(record.error), ...unread };
  const submit = () => {
    const amountCents = parseMoney(amount);
    const tipCents = tip.trim() === '' ? 0 : parseMoney(tip);
    const faults = {
      ...((amountCents === null || amountCents <= 0) && {
        amountCents: `Give an amount like ${money(bill.owedCents)}.`,
      }),
      ...((tipCents === null || tipCents < 0) && { tipCents: 'Give an amount like 10.00, or leave it empty.' }),
    };
    setUnread(faults);
    if (Object.keys(faults).length > 0 || record.isPending) return;
    const values = { method, amountCents: amountCents ?? 0, tipCents: tipCents ?? 0, reference };
    const of = JSON.stringify(values);
    // Pressed again after the line broke it is the very same press.
    const press = pressed?.of === of ? pressed : { of, deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs() };
    setPressed(press);
    const { deviceAt, offsetMs } = press;
    record.mutate({ key, ...values, deviceAt, offsetMs }, { onSuccess: onDone });
  };
  return (
    <form
      className="bl-task"
      aria-label="Record a payment"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <h3 className="sec">Record a payment</h3>
      <div className="bl-fields">
        <SelectField
          label="How it was paid"
          value={method}
          onChange={(event) => setMethod(handMethods.find((one) => one === event.target.value) ?? method)}
        >
          {handMethods.map((one) => (
            <option key={one} value={one}>
              {paymentMethodNames[one]}
            </option>
          ))}
        </SelectField>
        <TextField
          label="Towards the invoice"
          inputMode="decimal"
          value={amount}
          error={fields['amountCents']}
          onChange={(event) => setAmount(event.target.value)}
        />
        <TextField
          label={referenceNames[method]}
          value={reference}
          maxLength={300}
          error={fields['reference']}
          onChange={(event) => setReference(event.target.value)}
        />
        <TextField
          label="A tip for the crew beside it"
          inputMode="decimal"
          placeholder="none"
          value={tip}
          error={fields['tipCents']}
          onChange={(event) => setTip(event.target.value)}
        />
      </div>
      <FormFault error={record.error} fields={fields} />
      <div className="bl-foot">
        <Button onClick={onDone}>Leave</Button>
        <Button type="submit" look="main" isBusy={record.isPending}>
          Record {paymentMethodNames[method].toLowerCase()}
        </Button>
      </div>
    </form>
  );
}
