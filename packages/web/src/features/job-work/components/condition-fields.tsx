import { useState } from 'react';
import type { ChangeLine, RaisedCondition } from '@driprail/shared/domain/job-work/judge-change';
import { conditionNames, raisedConditions, surcharge } from '@driprail/shared/domain/job-work/judge-change';
import type { Surcharges } from '@driprail/shared/domain/menu/condition-surcharge';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { TextField } from '../../../components/field.tsx';
import { Picks } from '../../../components/picks.tsx';
import { money, parseMoney } from '../../../lib/format.ts';

const amounts = [1000, 2000, 3000, 5000];
const spans = [0, 15, 30, 60];

interface Fields {
  condition: RaisedCondition;
  extraCents: number;
  extraMinutes: number;
}

/** How much dirtier the car is than booked: by the menu's factor, or an amount and minutes of one's own. */
export function ConditionFields({
  line,
  surcharges,
  onChange,
}: {
  line: ChangeLine;
  surcharges: Surcharges;
  onChange: (fields: Fields | null) => void;
}) {
  const [condition, setCondition] = useState<RaisedCondition | null>(null);
  const [text, setText] = useState('');
  const [extraMinutes, setMinutes] = useState(30);
  const tell = (next: RaisedCondition, amount: string, minutes: number) => {
    setCondition(next);
    setText(amount);
    setMinutes(minutes);
    const cents = amount === '' ? 0 : parseMoney(amount);
    const isReadable = cents !== null && cents >= 0;
    if (next !== 'other') onChange({ condition: next, extraCents: 0, extraMinutes: 0 });
    else onChange(isReadable ? { condition: next, extraCents: cents, extraMinutes: minutes } : null);
  };
  const says = (one: RaisedCondition) => {
    if (one === 'other') return conditionNames[one];
    const extra = surcharge(line, { condition: one, extraCents: 0, extraMinutes: 0 }, surcharges);
    return `${conditionNames[one]}, +${money(extra.extraCents)}, ${formatMinutes(extra.extraMinutes)}`;
  };
  const isUnread = text !== '' && (parseMoney(text) ?? -1) < 0;
  return (
    <>
      <h2 className="sec">How it is</h2>
      <Picks
        options={raisedConditions}
        value={condition}
        onPick={(one) => tell(one, text, extraMinutes)}
        nameOf={says}
        className="grid gap-2 my-2"
      />
      {condition === 'other' ? (
        <>
          <Picks
            options={amounts}
            value={parseMoney(text)}
            onPick={(cents) => tell('other', money(cents), extraMinutes)}
            nameOf={(cents) => `+${money(cents)}`}
            className="grid grid-cols-4 gap-2 my-2"
          />
          <TextField
            label="Amount on top"
            inputMode="decimal"
            value={text}
            error={isUnread ? 'Give an amount like 20.00.' : undefined}
            onChange={(event) => tell('other', event.target.value, extraMinutes)}
          />
          <Picks
            options={spans}
            value={extraMinutes}
            onPick={(minutes) => tell('other', text, minutes)}
            nameOf={(minutes) => `+${minutes} min`}
            className="grid grid-cols-4 gap-2 my-2"
          />
        </>
      ) : null}
    </>
  );
}
