import { useState } from 'react';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { CheckField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { money, parseMoney } from '../../../lib/format.ts';
import { usePressPayment } from '../api/collect.queries.ts';
import { TipField } from './tip-field.tsx';

/** Cash or a check at the car: the amount, a tip, and a second press, since wet thumbs slip. */
export function CollectHand({
  bill,
  owedCents,
  method,
  onTaken,
}: {
  bill: BillDto;
  /** Less what waits to be sent. */
  owedCents: number;
  method: 'cash' | 'check';
  onTaken: () => void;
}) {
  const [amount, setAmount] = useState(() => money(owedCents));
  const [reference, setReference] = useState('');
  const [tipCents, setTip] = useState<number | null>(0);
  const [isKept, setKept] = useState(true);
  const [isAsking, setAsking] = useState(false);
  const press = usePressPayment(bill);
  const cents = parseMoney(amount);
  const fault =
    cents === null || cents <= 0
      ? `Give an amount like ${money(owedCents)}.`
      : cents > owedCents
        ? `Only ${money(owedCents)} is owed. Give change, or put the rest down as a tip.`
        : undefined;
  const isReady = fault === undefined && tipCents !== null;
  const all = (cents ?? 0) + (tipCents ?? 0);
  const take = () =>
    press.mutate(
      {
        ...{ method, amountCents: cents ?? 0, tipCents: tipCents ?? 0, reference },
        tipIsKept: method === 'cash' && isKept && (tipCents ?? 0) > 0,
      },
      { onSuccess: onTaken },
    );
  return (
    <>
      <TextField
        label="Towards the invoice"
        inputMode="decimal"
        value={amount}
        error={fault}
        onChange={(event) => {
          setAmount(event.target.value);
          setAsking(false);
        }}
      />
      {method === 'check' ? (
        <TextField
          label="Check number (may stay empty)"
          value={reference}
          maxLength={300}
          onChange={(event) => setReference(event.target.value)}
        />
      ) : null}
      <h2 className="sec mt-4">A tip for the crew</h2>
      <TipField billCents={bill.totalCents} value={tipCents} onChange={setTip} label="Tip" />
      {method === 'cash' && (tipCents ?? 0) > 0 ? (
        <CheckField
          label="The crew keeps the tip on the spot"
          checked={isKept}
          onChange={(event) => setKept(event.target.checked)}
        />
      ) : null}
      <FormFault error={press.error} fields={{}} />
      <footer className="ph-act">
        {isAsking ? (
          <div className="ask">
            <p>
              <b>{money(all)}</b> in {method === 'cash' ? 'cash' : 'a check'} is in hand?
            </p>
            <div className="grid grid-cols-[1fr_1.6fr] gap-2">
              <button type="button" className="btn" onClick={() => setAsking(false)}>
                Not yet
              </button>
              <button type="button" className="ph-main seal" disabled={press.isPending} onClick={take}>
                Yes, taken
              </button>
            </div>
          </div>
        ) : (
          <button type="button" className="ph-main seal" disabled={!isReady} onClick={() => setAsking(true)}>
            {method === 'cash' ? 'Cash' : 'Check'} {money(all)}
          </button>
        )}
      </footer>
    </>
  );
}
