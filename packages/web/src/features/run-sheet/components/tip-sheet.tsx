import { useState } from 'react';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { parseMoney } from '../../../lib/format.ts';
import { useRecordTip } from '../api/run-sheet.queries.ts';
import { Picks } from '../../../components/picks.tsx';

const amounts = ['5', '10', '15', '20', '30', '40'];
const methods = [
  ['cash', 'Cash'],
  ['card', 'Card'],
  ['invoice', 'With the invoice'],
] as const;

/** A tip belongs to the crew. Cash kept on the spot is recorded and adds nothing to what is to be paid. */
export function TipSheet({
  visit,
  tipsGoTo,
  onClose,
}: {
  visit: RunVisitDto;
  tipsGoTo: RunSheetDto['tipsGoTo'];
  onClose: () => void;
}) {
  const [amount, setAmount] = useState('');
  const [method, setMethod] = useState<'cash' | 'card' | 'invoice'>('cash');
  const [isKept, setKept] = useState(true);
  const [forPersonId, setFor] = useState<string | null>(null);
  const tip = useRecordTip(visit);
  const cents = parseMoney(amount);
  return (
    <Sheet title="Tip" onClose={onClose} width={460}>
      <div className="ph-sheet">
        <p className="t-2 mb-2">{visit.customerName}. Shared by the crew, never by the house.</p>
        <Picks options={amounts} value={amount} onPick={setAmount} className="grid grid-cols-3 gap-2 mb-3" />
        <TextField
          label="Amount"
          inputMode="decimal"
          value={amount}
          onChange={(event) => setAmount(event.target.value)}
          error={amount !== '' && cents === null ? 'Give an amount like 15.00.' : tip.error?.message}
        />
        <div className="grid grid-cols-3 gap-2 my-3" role="radiogroup" aria-label="How">
          {methods.map(([value, label]) => (
            <button
              key={value}
              type="button"
              role="radio"
              aria-checked={method === value}
              className={method === value ? 'btn is-picked' : 'btn'}
              onClick={() => setMethod(value)}
            >
              {label}
            </button>
          ))}
        </div>
        {tipsGoTo === 'person' && visit.crew.length > 1 ? (
          <SelectField
            label="Meant for"
            value={forPersonId ?? ''}
            onChange={(event) => setFor(event.target.value || null)}
          >
            <option value="">The crew</option>
            {visit.crew.map((member) => (
              <option key={member.personId} value={member.personId}>
                {member.name}
              </option>
            ))}
          </SelectField>
        ) : null}
        {method === 'cash' ? (
          <CheckField
            label="Kept by the crew on the spot"
            checked={isKept}
            onChange={(event) => setKept(event.target.checked)}
          />
        ) : null}
      </div>
      <SheetFoot>
        <Button
          look="main"
          isBusy={tip.isPending}
          disabled={cents === null || cents <= 0}
          onClick={() =>
            tip.mutate(
              { amountCents: cents ?? 0, method, alreadyReceived: method === 'cash' && isKept, forPersonId },
              { onSuccess: onClose },
            )
          }
        >
          Record the tip
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
