import { CheckField, TextField } from '../../../components/field.tsx';
import type { CountedUnit } from './adjustment-kinds.ts';

interface Counted {
  isCounted: boolean;
  quantity: string;
}

interface Props {
  words: CountedUnit;
  value: Counted;
  on: string;
  errors: Record<string, string>;
  onChange: (parts: Partial<Counted> & { on?: string }) => void;
}

/** How many, and on which day's rate; the company works the amount out. */
export function CountedFields({ words, value, on, errors, onChange }: Props) {
  return (
    <div className="mt-3">
      <CheckField
        label={words.label}
        checked={value.isCounted}
        onChange={(event) => onChange({ isCounted: event.target.checked })}
      />
      {value.isCounted ? (
        <div className="grid grid-cols-2 gap-3 mt-3 max-[520px]:grid-cols-1">
          <TextField
            label={words.quantity}
            inputMode="decimal"
            value={value.quantity}
            error={errors['counted.quantity']}
            onChange={(event) => onChange({ quantity: event.target.value })}
          />
          <TextField
            label="By the rate of"
            type="date"
            value={on}
            error={errors['counted.on']}
            onChange={(event) => onChange({ on: event.target.value })}
          />
        </div>
      ) : null}
    </div>
  );
}
