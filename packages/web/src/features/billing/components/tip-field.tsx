import { useState } from 'react';
import { TextField } from '../../../components/field.tsx';
import { money, parseMoney } from '../../../lib/format.ts';

/**
 * Three round amounts near a tenth, a seventh and a fifth of the bill; cents. Whole dollars, from twenty on whole fives;
 * none is chosen beforehand.
 */
export function tipOffers(billCents: number): number[] {
  const near = (part: number) => {
    const dollars = billCents / part / 100;
    return (dollars < 20 ? Math.max(1, Math.round(dollars)) : Math.round(dollars / 5) * 5) * 100;
  };
  const [low, middle, high] = [near(10), near(7), near(5)];
  return [low, Math.max(middle, low + 100), Math.max(high, middle + 100, low + 200)];
}

/** A tip by a press, or another amount by hand. Null while what is typed is no amount. */
export function TipField({
  billCents,
  value,
  onChange,
  label,
}: {
  billCents: number;
  value: number | null;
  onChange: (cents: number | null) => void;
  label: string;
}) {
  const offers = [0, ...tipOffers(billCents)];
  const [typed, setTyped] = useState<string | null>(null);
  const cents = typed === null ? null : parseMoney(typed);
  const isBad = typed !== null && typed !== '' && (cents === null || cents < 0);
  const pick = (amount: number) => {
    setTyped(null);
    onChange(amount);
  };
  return (
    <>
      <div className="tips" role="radiogroup" aria-label={label}>
        {offers.map((amount) => (
          <button
            key={amount}
            type="button"
            role="radio"
            aria-checked={typed === null && value === amount}
            onClick={() => pick(amount)}
          >
            {amount === 0 ? 'None' : money(amount).replace(/\.00$/, '')}
          </button>
        ))}
        <button type="button" role="radio" aria-checked={typed !== null} onClick={() => setTyped('')}>
          Else
        </button>
      </div>
      {typed === null ? null : (
        <div className="mt-2">
          <TextField
            label="Tip in dollars"
            inputMode="decimal"
            autoFocus
            value={typed}
            error={isBad ? 'Give an amount like 12.00.' : undefined}
            onChange={(event) => {
              setTyped(event.target.value);
              const next = event.target.value.trim() === '' ? 0 : parseMoney(event.target.value);
              onChange(next !== null && next >= 0 ? next : null);
            }}
          />
        </div>
      )}
    </>
  );
}
