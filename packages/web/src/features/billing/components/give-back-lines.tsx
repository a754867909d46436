import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { TextField } from '../../../components/field.tsx';
import { money } from '../../../lib/format.ts';
import { leftOf } from './credit-draft.ts';
import type { CreditDraft } from './credit-draft.ts';

/** An amount per line of the invoice, each with what is left of it. */
export function GiveBackLines({
  bill,
  texts,
  credit,
  error,
  onChange,
}: {
  bill: BillDto;
  texts: Record<string, string>;
  credit: CreditDraft;
  error: string | undefined;
  onChange: (texts: Record<string, string>) => void;
}) {
  return (
    <div className="bl-lines">
      {bill.lines.map((line) => {
        const left = leftOf(line);
        return (
          <div key={line.id} role="group" aria-label={line.label}>
            <span>
              {line.label}
              {line.detail ? <small>{line.detail}</small> : null}
            </span>
            <button
              type="button"
              className="link"
              disabled={left === 0}
              onClick={() => onChange({ ...texts, [line.id]: (left / 100).toFixed(2) })}
            >
              All {money(left)}
            </button>
            <TextField
              label={<span className="sr">Before tax, of {line.label}</span>}
              inputMode="decimal"
              placeholder="none"
              disabled={left === 0}
              value={texts[line.id] ?? ''}
              error={credit.faults[line.id]}
              onChange={(event) => onChange({ ...texts, [line.id]: event.target.value })}
            />
          </div>
        );
      })}
      {error ? (
        <p className="tape err" role="alert">
          {error}
        </p>
      ) : null}
    </div>
  );
}
