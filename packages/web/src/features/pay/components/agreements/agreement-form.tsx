import { useState } from 'react';
import { agreementKinds } from '@driprail/shared/contracts/pay-agreements.contract';
import type { AgreementDto } from '@driprail/shared/contracts/pay-agreements.contract';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { Button } from '../../../../components/button.tsx';
import { NamedOptions, CheckField, SelectField, TextField } from '../../../../components/field.tsx';
import { FormError } from '../../../../components/form-error.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { useAddAgreement } from '../../api/agreements.queries.ts';
import { agreementWords } from './agreement-words.ts';

interface Props {
  people: PersonDto[];
  personId: string | null;
  startsOn: string;
  onDone: () => void;
}

/** What a person signed and from which workweek on it holds; or that it ends. */
export function AgreementForm({ people, personId, startsOn, onDone }: Props) {
  const add = useAddAgreement();
  const [value, setValue] = useState({
    personId: personId ?? people[0]?.id ?? '',
    kind: 'refunds' as AgreementDto['kind'],
    startsOn,
    signedOn: '',
    note: '',
    isEnd: false,
  });
  const fields = fieldsOf(add.error);
  const submit = () => {
    const { isEnd, ...body } = value;
    if (!add.isPending) add.mutate({ ...body, signedOn: isEnd ? null : value.signedOn }, { onSuccess: onDone });
  };
  return (
    <form
      noValidate
      className="dated-form"
      aria-label="Record an agreement"
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <div className="grid grid-cols-2 gap-3 max-[520px]:grid-cols-1">
        <SelectField
          label="Who"
          value={value.personId}
          error={fields['personId']}
          onChange={(event) => setValue({ ...value, personId: event.target.value })}
        >
          <NamedOptions of={people} />
        </SelectField>
        <SelectField
          label="Agreed to"
          value={value.kind}
          error={fields['kind']}
          onChange={(event) => setValue({ ...value, kind: event.target.value as AgreementDto['kind'] })}
        >
          {agreementKinds.map((kind) => (
            <option key={kind} value={kind}>
              {agreementWords[kind].label}
            </option>
          ))}
        </SelectField>
        <TextField
          label="From the workweek of"
          type="date"
          value={value.startsOn}
          error={fields['startsOn']}
          onChange={(event) => setValue({ ...value, startsOn: event.target.value })}
        />
        {value.isEnd ? null : (
          <TextField
            label="Signed on"
            type="date"
            value={value.signedOn}
            error={fields['signedOn']}
            onChange={(event) => setValue({ ...value, signedOn: event.target.value })}
          />
        )}
      </div>
      <TextField
        className="mt-3"
        label={value.isEnd ? 'Why it ends' : 'What was agreed, and where the paper is kept'}
        value={value.note}
        error={fields['note']}
        onChange={(event) => setValue({ ...value, note: event.target.value })}
      />
      <div className="mt-3">
        <CheckField
          label="An earlier one ends here"
          checked={value.isEnd}
          onChange={(event) => setValue({ ...value, isEnd: event.target.checked })}
        />
      </div>
      <p className="caution mt-3">
        <b>Caution.</b> {agreementWords[value.kind].caution} Ask a licensed adviser.
      </p>
      <FormError error={add.error} />
      <p className="mt-3 flex gap-2">
        <Button type="submit" look="main" isBusy={add.isPending}>
          {value.isEnd ? 'Record the end' : 'Record the agreement'}
        </Button>
        <Button onClick={onDone}>Leave it</Button>
      </p>
    </form>
  );
}
