import { useState } from 'react';
import type { TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { FormError } from '../../../../components/form-error.tsx';
import { Button } from '../../../../components/button.tsx';
import { TextField } from '../../../../components/field.tsx';
import { SheetFoot } from '../../../../components/sheet.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { useAdjustTimeOff } from '../../api/time-off.queries.ts';
import { KindField } from './kind-field.tsx';

/** An opening balance or a correction of a person's hours; it stays in the ledger with its reason. */
export function LedgerAdjustForm({ personId, on, onDone }: { personId: string; on: string; onDone: () => void }) {
  const adjust = useAdjustTimeOff();
  const [value, setValue] = useState({ kind: 'sick' as TimeOffKind, on, hours: '', reason: 'Opening balance' });
  const fields = fieldsOf(adjust.error);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const hours = value.hours.trim().replace('−', '-');
        if (!adjust.isPending) adjust.mutate({ ...value, personId, hours }, { onSuccess: onDone });
      }}
    >
      <div className="grid grid-cols-3 gap-3 max-[520px]:grid-cols-1">
        <KindField
          label="Kind"
          value={value.kind}
          error={fields['kind']}
          onChange={(kind) => setValue({ ...value, kind })}
        />
        <TextField
          label="Hours"
          inputMode="decimal"
          hint="With a minus sign they are taken away."
          value={value.hours}
          error={fields['hours']}
          onChange={(event) => setValue({ ...value, hours: event.target.value })}
        />
        <TextField
          label="On"
          type="date"
          value={value.on}
          error={fields['on']}
          onChange={(event) => setValue({ ...value, on: event.target.value })}
        />
      </div>
      <TextField
        className="mt-3"
        label="What it is for"
        value={value.reason}
        error={fields['reason']}
        onChange={(event) => setValue({ ...value, reason: event.target.value })}
      />
      <FormError error={adjust.error} />
      <SheetFoot>
        <Button onClick={onDone}>Leave it</Button>
        <Button type="submit" look="main" isBusy={adjust.isPending}>
          Add to the ledger
        </Button>
      </SheetFoot>
    </form>
  );
}
