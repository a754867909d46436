import { useState } from 'react';
import { Button } from '../../../../components/button.tsx';
import { CheckField, TextField } from '../../../../components/field.tsx';
import { FormError } from '../../../../components/form-error.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { useAddRefundReason } from '../../api/agreements.queries.ts';

/** Why customers get money back, and whether that lowers commission. The same name again changes it from its day on. */
export function RefundReasonForm({ startsOn, onDone }: { startsOn: string; onDone: () => void }) {
  const add = useAddRefundReason();
  const [value, setValue] = useState({ name: '', lowersCommission: true, startsOn });
  const fields = fieldsOf(add.error);
  return (
    <form
      noValidate
      className="dated-form mb-5"
      aria-label="Add a reason"
      onSubmit={(event) => {
        event.preventDefault();
        if (!add.isPending) add.mutate(value, { onSuccess: onDone });
      }}
    >
      <div className="grid grid-cols-2 gap-3 max-[520px]:grid-cols-1">
        <TextField
          label="Reason"
          value={value.name}
          error={fields['name']}
          hint="The same name again changes what it does, from its day on."
          onChange={(event) => setValue({ ...value, name: event.target.value })}
        />
        <TextField
          label="From"
          type="date"
          value={value.startsOn}
          error={fields['startsOn']}
          onChange={(event) => setValue({ ...value, startsOn: event.target.value })}
        />
      </div>
      <div className="mt-3">
        <CheckField
          label="Lowers commission"
          checked={value.lowersCommission}
          onChange={(event) => setValue({ ...value, lowersCommission: event.target.checked })}
        />
      </div>
      <FormError error={add.error} />
      <p className="mt-3 flex gap-2">
        <Button type="submit" look="main" isBusy={add.isPending}>
          Add the reason
        </Button>
        <Button onClick={onDone}>Leave it</Button>
      </p>
    </form>
  );
}
