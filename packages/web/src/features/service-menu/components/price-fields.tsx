import { sizeClassNames, sizeClasses } from '@driprail/shared/contracts/fields';
import { TextField } from '../../../components/field.tsx';
import type { PriceTexts } from './price-texts.ts';

/** Price and minutes of one person for each size class; an empty row is not sold. */
export function PriceFields({
  value,
  fields,
  onChange,
}: {
  value: PriceTexts;
  fields: Record<string, string>;
  onChange: (prices: PriceTexts) => void;
}) {
  return (
    <>
      <h3 className="sec mt-4">Price and minutes by size class</h3>
      <div className="grid gap-2 mt-2">
        {sizeClasses.map((size) => (
          <div
            key={size}
            role="group"
            aria-label={sizeClassNames[size]}
            className="grid grid-cols-[1fr_120px_120px] gap-3 items-end"
          >
            <span className="self-center">{sizeClassNames[size]}</span>
            <TextField
              label="Price"
              inputMode="decimal"
              placeholder="not sold"
              value={value[size].price}
              error={fields[`price.${size}`]}
              onChange={(event) => onChange({ ...value, [size]: { ...value[size], price: event.target.value } })}
            />
            <TextField
              label="Minutes"
              inputMode="numeric"
              value={value[size].minutes}
              error={fields[`minutes.${size}`]}
              onChange={(event) => onChange({ ...value, [size]: { ...value[size], minutes: event.target.value } })}
            />
          </div>
        ))}
      </div>
    </>
  );
}
