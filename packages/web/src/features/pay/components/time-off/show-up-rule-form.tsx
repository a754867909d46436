import { useState } from 'react';
import type { PayPlaceDto } from '@driprail/shared/contracts/pay-plans.contract';
import type { ShowUpRule } from '@driprail/shared/domain/pay/time-off/show-up-rule';
import { FormError } from '../../../../components/form-error.tsx';
import { Button } from '../../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../../components/field.tsx';
import { SheetFoot } from '../../../../components/sheet.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { useAddShowUpRule } from '../../api/time-off.queries.ts';
import { StartField } from './start-field.tsx';

type Pays = 'show_up' | 'no_show_trip' | 'no show_up' | 'no no_show_trip';
const paysWords: Record<Pays, string> = {
  show_up: 'A day with less work, up to so many hours',
  no_show_trip: 'A trip on which nobody was home',
  'no show_up': 'No show-up pay from then on',
  'no no_show_trip': 'No pay for such trips from then on',
};

/** Show-up pay or pay for a no-show trip from a workweek on, of the company or of a place. */
export function ShowUpRuleForm({
  places,
  startsOn,
  onDone,
}: {
  places: PayPlaceDto[];
  startsOn: string;
  onDone: () => void;
}) {
  const add = useAddShowUpRule();
  const [value, setValue] = useState({
    ...{ pays: 'show_up' as Pays, placeId: '', startsOn, hours: '2', dollars: '15.00', isShared: 'each', source: '' },
  });
  const fields = fieldsOf(add.error);
  const set = (next: Partial<typeof value>) => setValue({ ...value, ...next });
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const { placeId, startsOn: from, source } = value;
        if (!add.isPending)
          add.mutate({ placeId: placeId || null, startsOn: from, source, rule: ruleOf(value) }, { onSuccess: onDone });
      }}
    >
      <div className="grid grid-cols-2 gap-3 max-[520px]:grid-cols-1">
        <SelectField label="Pays" value={value.pays} onChange={(event) => set({ pays: event.target.value as Pays })}>
          {(Object.keys(paysWords) as Pays[]).map((pays) => (
            <option key={pays} value={pays}>
              {paysWords[pays]}
            </option>
          ))}
        </SelectField>
        <SelectField
          label="In"
          value={value.placeId}
          error={fields['placeId']}
          onChange={(event) => set({ placeId: event.target.value })}
        >
          <option value="">the company</option>
          <NamedOptions of={places} />
        </SelectField>
        <StartField value={value.startsOn} error={fields['startsOn']} onChange={(from) => set({ startsOn: from })} />
        {value.pays === 'show_up' ? (
          <TextField
            label="Hours a day that are paid at least"
            inputMode="decimal"
            value={value.hours}
            error={fields['rule.hours']}
            onChange={(event) => set({ hours: event.target.value })}
          />
        ) : null}
        {value.pays === 'no_show_trip' ? (
          <>
            <TextField
              label="Dollars a trip"
              inputMode="decimal"
              value={value.dollars}
              error={fields['rule.dollars']}
              onChange={(event) => set({ dollars: event.target.value })}
            />
            <SelectField
              label="Who gets it"
              value={value.isShared}
              onChange={(event) => set({ isShared: event.target.value })}
            >
              <option value="each">each of the crew</option>
              <option value="shared">shared in the crew</option>
            </SelectField>
          </>
        ) : null}
        <TextField
          label="Where it is written"
          hint="The law of the place or your agreement."
          value={value.source}
          error={fields['source']}
          onChange={(event) => set({ source: event.target.value })}
        />
      </div>
      <p className="t-2 mt-3">
        {value.pays === 'no_show_trip'
          ? 'Paid when a visit is called off after Arrived and Nobody home was reported. It pays for work done, so it counts in the regular rate.'
          : 'Hours that were not worked stay out of the regular rate and overtime (29 CFR 778.220). Nobody was sent home on a day with paid hours off or a day away: write the day under People when somebody leaves early by own wish. A salary or day rate pays its days whole.'}
      </p>
      <FormError error={add.error} />
      <SheetFoot>
        <Button onClick={onDone}>Leave it</Button>
        <Button type="submit" look="main" isBusy={add.isPending}>
          Add rule
        </Button>
      </SheetFoot>
    </form>
  );
}

function ruleOf({
  pays,
  hours,
  dollars,
  isShared,
}: {
  pays: Pays;
  hours: string;
  dollars: string;
  isShared: string;
}): ShowUpRule {
  if (pays === 'show_up') return { pays, hours };
  if (pays === 'no_show_trip')
    return { pays, dollars: dollars.replace(/[$,\s]/g, ''), isShared: isShared === 'shared' };
  return { pays: 'nothing', of: pays === 'no show_up' ? 'show_up' : 'no_show_trip' };
}
