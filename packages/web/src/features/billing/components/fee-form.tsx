import { useState } from 'react';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { feeKinds, feeNames } from '@driprail/shared/contracts/billing.contract';
import type { TaxClass } from '@driprail/shared/domain/billing/tax-rates';
import { taxClassNames, taxClasses } from '@driprail/shared/domain/billing/tax-rates';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { parseMoney } from '../../../lib/format.ts';
import { useBillFee } from '../api/money.queries.ts';

/** A fee for a job that was called off. Whether one may be asked is a matter of the policy and of the place's law. */
export function FeeForm({ bill, onDone }: { bill: BillDto; onDone: () => void }) {
  const fee = useBillFee(bill.jobId);
  const [kind, setKind] = useState<(typeof feeKinds)[number]>('late_call_off');
  const [amount, setAmount] = useState(() =>
    bill.proposedFeeCents === null ? '' : (bill.proposedFeeCents / 100).toFixed(2),
  );
  const [taxClass, setTaxClass] = useState<TaxClass>('untaxed');
  const [note, setNote] = useState('');
  const [isUnread, setUnread] = useState(false);
  const fields = fieldsOf(fee.error);
  const submit = () => {
    const amountCents = parseMoney(amount);
    const isGood = amountCents !== null && amountCents > 0;
    setUnread(!isGood);
    if (isGood && !fee.isPending) fee.mutate({ kind, amountCents, taxClass, note }, { onSuccess: onDone });
  };
  return (
    <form
      className="bl-task"
      aria-label="Bill a fee"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <h3 className="sec">Bill a fee</h3>
      <div className="bl-fields">
        <SelectField
          label="What it is for"
          value={kind}
          onChange={(event) => setKind(feeKinds.find((one) => one === event.target.value) ?? kind)}
        >
          {feeKinds.map((one) => (
            <option key={one} value={one}>
              {feeNames[one]}
            </option>
          ))}
        </SelectField>
        <TextField
          label="Amount before tax"
          hint={bill.proposedFeeCents === null ? undefined : 'What the customer was shown when calling off.'}
          inputMode="decimal"
          value={amount}
          error={isUnread ? 'Give an amount like 40.00.' : fields['amountCents']}
          onChange={(event) => setAmount(event.target.value)}
        />
        <SelectField
          label="Sales tax"
          value={taxClass}
          onChange={(event) => setTaxClass(taxClasses.find((one) => one === event.target.value) ?? taxClass)}
        >
          {taxClasses.map((one) => (
            <option key={one} value={one}>
              {taxClassNames[one]}
            </option>
          ))}
        </SelectField>
        <TextField label="Note on the invoice" value={note} maxLength={300} onChange={(e) => setNote(e.target.value)} />
      </div>
      <p className="t-2 py-2">
        <b>Caution.</b> Bill only what the customer agreed to beforehand; places limit such fees by law.
      </p>
      <FormFault error={fee.error} fields={fields} />
      <div className="flex gap-2 justify-end">
        <Button onClick={onDone}>Leave</Button>
        <Button type="submit" look="main" isBusy={fee.isPending}>
          Bill the fee
        </Button>
      </div>
    </form>
  );
}
