import { useState } from 'react';
import type { PayPlaceDto } from '@driprail/shared/contracts/pay-plans.contract';
import { FormError } from '../../../components/form-error.tsx';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useAddWage } from '../api/plans.queries.ts';

/** A place's minimum wage from a day on. */
export function WageForm({ place, startsOn, onDone }: { place: PayPlaceDto; startsOn: string; onDone: () => void }) {
  const add = useAddWage();
  const [value, setValue] = useState({ startsOn, amount: '', source: '' });
  const fields = fieldsOf(add.error);
  return (
    <form
      noValidate
      className="dated-form"
      onSubmit={(event) => {
        event.preventDefault();
        const body = { ...value, amount: value.amount.replace(/[$,\s]/g, '') };
        if (!add.isPending) add.mutate({ placeId: place.id, body }, { onSuccess: onDone });
      }}
    >
      <h3>Minimum wage of {place.name}</h3>
      <div className="grid grid-cols-3 gap-3 max-[520px]:grid-cols-1">
        <TextField
          label="Dollars an hour"
          inputMode="decimal"
          value={value.amount}
          error={fields['amount']}
          onChange={(event) => setValue({ ...value, amount: event.target.value })}
        />
        <TextField
          label="From"
          type="date"
          value={value.startsOn}
          error={fields['startsOn']}
          onChange={(event) => setValue({ ...value, startsOn: event.target.value })}
        />
        <TextField
          label="Where it is written"
          value={value.source}
          error={fields['source']}
          onChange={(event) => setValue({ ...value, source: event.target.value })}
        />
      </div>
      <FormError error={add.error} />
      <Button type="submit" look="main" isBusy={add.isPending}>
        Add minimum wage
      </Button>
    </form>
  );
}
