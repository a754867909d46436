import { useState } from 'react';
import type { SurchargedCondition, Surcharges } from '@driprail/shared/domain/menu/condition-surcharge';
import { surchargedConditions } from '@driprail/shared/domain/menu/condition-surcharge';
import { conditionNames } from '@driprail/shared/domain/job-work/judge-change';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useSetSurcharge } from '../api/services.queries.ts';

/** What a dirtier car costs and takes on top, from a day on. */
export function SurchargeForm({
  surcharges,
  today,
  onDone,
}: {
  surcharges: Surcharges;
  today: string;
  onDone: () => void;
}) {
  const [condition, setCondition] = useState<SurchargedCondition>('dirty');
  const [value, setValue] = useState(surcharges.dirty);
  const [startsOn, setStartsOn] = useState(today);
  const save = useSetSurcharge();
  const fields = fieldsOf(save.error);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!save.isPending) save.mutate({ condition, ...value, startsOn }, { onSuccess: onDone });
      }}
    >
      <div className="grid grid-cols-2 gap-3 max-[560px]:grid-cols-1">
        <SelectField
          label="Condition"
          value={condition}
          onChange={(event) => {
            const next = surchargedConditions.find((one) => one === event.target.value) ?? condition;
            setCondition(next);
            setValue(surcharges[next]);
          }}
        >
          {surchargedConditions.map((one) => (
            <option key={one} value={one}>
              {conditionNames[one]}
            </option>
          ))}
        </SelectField>
        <TextField
          label="From"
          type="date"
          value={startsOn}
          error={fields['startsOn']}
          onChange={(event) => setStartsOn(event.target.value)}
        />
        <TextField
          label="Price on top, percent"
          type="number"
          value={value.pricePercent}
          error={fields['pricePercent']}
          onChange={(event) => setValue({ ...value, pricePercent: Number(event.target.value) })}
        />
        <TextField
          label="Minutes on top, percent"
          type="number"
          value={value.minutesPercent}
          error={fields['minutesPercent']}
          onChange={(event) => setValue({ ...value, minutesPercent: Number(event.target.value) })}
        />
      </div>
      <p className="t-2 pt-3">
        The crew raises it at the car with the customer’s yes; what was quoted keeps its price.
      </p>
      <FormFault error={save.error} fields={fields} />
      <SheetFoot>
        <Button onClick={onDone}>Leave</Button>
        <Button type="submit" look="main" isBusy={save.isPending}>
          Save surcharge
        </Button>
      </SheetFoot>
    </form>
  );
}
