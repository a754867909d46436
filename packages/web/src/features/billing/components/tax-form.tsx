import { useState } from 'react';
import { ratedClasses } from '@driprail/shared/contracts/taxes.contract';
import type { TaxRateDto } from '@driprail/shared/contracts/taxes.contract';
import { taxClassNames } from '@driprail/shared/domain/billing/tax-rates';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useAddTaxRate } from '../api/taxes.queries.ts';

export type TaxStart = Pick<TaxRateDto, 'name' | 'place' | 'taxClass' | 'percent' | 'startsOn'>;

/** A tax from a day on. What was billed keeps the tax it was billed with. */
export function TaxForm({ start, onDone }: { start: TaxStart; onDone: () => void }) {
  const add = useAddTaxRate();
  const [value, setValue] = useState(start);
  const fields = fieldsOf(add.error);
  const text = (name: 'name' | 'place' | 'percent' | 'startsOn') => ({
    value: value[name],
    error: fields[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) => setValue({ ...value, [name]: event.target.value }),
  });
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        // A comma is how some write the point.
        if (!add.isPending)
          add.mutate({ ...value, percent: value.percent.trim().replace(',', '.') }, { onSuccess: onDone });
      }}
    >
      <div className="bl-fields">
        <TextField label="Name, as on invoices" placeholder="State sales tax" maxLength={60} {...text('name')} />
        <TextField
          label="Town it holds in"
          placeholder="everywhere"
          hint="As in the address of the job. A town’s own rate goes before the one of that name for everywhere."
          maxLength={80}
          {...text('place')}
        />
        <TextField
          label="Percent"
          inputMode="decimal"
          placeholder="6.25"
          hint="0 ends this tax from that day on."
          {...text('percent')}
        />
        <TextField label="From this day on" type="date" {...text('startsOn')} />
        <SelectField
          className="is-wide"
          label="On services that are"
          value={value.taxClass}
          error={fields['taxClass']}
          hint="What each service is taxed as is set on the service menu."
          onChange={(event) =>
            setValue({
              ...value,
              taxClass: ratedClasses.find((one) => one === event.target.value) ?? value.taxClass,
            })
          }
        >
          {ratedClasses.map((one) => (
            <option key={one} value={one}>
              {taxClassNames[one]}
            </option>
          ))}
        </SelectField>
      </div>
      <FormFault className="mt-3" error={add.error} fields={fields} />
      <SheetFoot>
        <Button onClick={onDone}>Leave</Button>
        <Button type="submit" look="main" isBusy={add.isPending}>
          Add rate
        </Button>
      </SheetFoot>
    </form>
  );
}
