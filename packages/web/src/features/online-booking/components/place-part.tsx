import { useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { CheckField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { windowsQuery } from '../api/online-booking.queries.ts';
import { askOf } from './book-draft.ts';
import { StepFoot } from './book-step.tsx';
import type { PartProps } from './car-and-work.tsx';

/** Where the car stands; whether we go there is said here, before a time is looked for. */
export function PlacePart({ menu, draft, cents, set, onNext }: PartProps) {
  const client = useQueryClient();
  const [isBusy, setBusy] = useState(false);
  const [error, setError] = useState<Error | null>(null);
  const fields = fieldsOf(error);
  const text = (name: 'line' | 'city' | 'postcode') => ({
    value: draft[name],
    error: fields[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) =>
      set({ [name]: event.target.value, hold: null, isCodeSent: false }),
  });
  const look = async () => {
    const ask = askOf(menu, draft);
    if (!ask) return;
    setBusy(true);
    setError(null);
    try {
      await client.fetchQuery(windowsQuery(ask));
      onNext();
    } catch (fault) {
      setError(fault as Error);
    }
    setBusy(false);
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!isBusy) void look();
      }}
    >
      <div className="grid gap-3">
        <TextField label="Street and number" autoComplete="address-line1" {...text('line')} />
        <div className="grid grid-cols-2 gap-3">
          <TextField label="Town" autoComplete="address-level2" {...text('city')} />
          <TextField label="ZIP code" autoComplete="postal-code" inputMode="numeric" {...text('postcode')} />
        </div>
        <fieldset>
          <legend className="sec w-full">What we may use there</legend>
          <CheckField
            label="A spigot for water"
            checked={draft.hasWater}
            onChange={({ target }) => set({ hasWater: target.checked, hold: null, isCodeSent: false })}
          />
          <CheckField
            label="A power outlet"
            checked={draft.hasPower}
            onChange={({ target }) => set({ hasPower: target.checked, hold: null, isCodeSent: false })}
          />
        </fieldset>
      </div>
      {fields['serviceIds'] ? (
        <p className="tape my-2" role="alert">
          <b>{fields['serviceIds']}</b>
        </p>
      ) : null}
      <FormFault error={error} fields={fields} className="my-2" />
      <StepFoot cents={cents} label="See free times" isBusy={isBusy} />
    </form>
  );
}
