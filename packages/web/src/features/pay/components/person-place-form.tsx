import { useState } from 'react';
import type { PayPlaceDto } from '@driprail/shared/contracts/pay-plans.contract';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { FormError } from '../../../components/form-error.tsx';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useSetPersonPlace } from '../api/plans.queries.ts';

interface Props {
  people: PersonDto[];
  places: PayPlaceDto[];
  startsOn: string;
  onDone: () => void;
}

/** Where a person works from a workweek on. */
export function PersonPlaceForm({ people, places, startsOn, onDone }: Props) {
  const set = useSetPersonPlace();
  const [value, setValue] = useState({ personId: '', placeId: places[0]?.id ?? '', startsOn });
  const fields = fieldsOf(set.error);
  return (
    <form
      noValidate
      className="dated-form"
      onSubmit={(event) => {
        event.preventDefault();
        if (!set.isPending) set.mutate({ ...value, placeId: value.placeId || null }, { onSuccess: onDone });
      }}
    >
      <h3>Where a person works</h3>
      <div className="grid grid-cols-3 gap-3 max-[520px]:grid-cols-1">
        <SelectField
          label="Person"
          value={value.personId}
          error={fields['personId']}
          onChange={(event) => setValue({ ...value, personId: event.target.value })}
        >
          <option value="">Choose</option>
          <NamedOptions of={people} />
        </SelectField>
        <SelectField
          label="Works in"
          value={value.placeId}
          error={fields['placeId']}
          onChange={(event) => setValue({ ...value, placeId: event.target.value })}
        >
          <NamedOptions of={places} />
          <option value="">the company’s rules alone</option>
        </SelectField>
        <TextField
          label="From, the first day of a workweek"
          type="date"
          value={value.startsOn}
          error={fields['startsOn']}
          onChange={(event) => setValue({ ...value, startsOn: event.target.value })}
        />
      </div>
      <FormError error={set.error} />
      <Button type="submit" look="main" isBusy={set.isPending}>
        Place person
      </Button>
    </form>
  );
}
