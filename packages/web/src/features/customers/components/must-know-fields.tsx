import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { CheckField, TextField } from '../../../components/field.tsx';

interface Fields {
  register: UseFormRegister<CustomerBody>;
}

type Wrong = Partial<Record<'mustKnow' | 'keyGoesBack', { message?: string | undefined }>> | undefined;

/** What each crew confirms before it starts, about the customer. */
export function CustomerMustKnows({ register, errors }: Fields & { errors: FieldErrors<CustomerBody> }) {
  return (
    <fieldset className="mt-4">
      <legend className="sec w-full">
        Must-knows <span>every crew confirms them before Start work</span>
      </legend>
      <div className="grid grid-cols-[auto_auto_1fr] gap-x-6 items-end max-[560px]:grid-cols-1">
        <CheckField label="No scent" {...register('isScentFree')} />
        <CheckField label="Ring first" {...register('ringsFirst')} />
        <TextField
          label="Something else every crew must know"
          {...register('mustKnow')}
          error={errors.mustKnow?.message}
        />
      </div>
    </fieldset>
  );
}

export function AddressMustKnows({ at, register, errors }: Fields & { at: `addresses.${number}`; errors: Wrong }) {
  return (
    <fieldset className="col-span-6 max-[560px]:col-span-2 grid grid-cols-6 gap-x-3 gap-y-2 items-end max-[560px]:grid-cols-2">
      <legend className="sr">Must-knows of this address</legend>
      <CheckField label="Dog" {...register(`${at}.hasDog`)} />
      <CheckField label="Shut the gate" {...register(`${at}.shutsGate`)} />
      <CheckField label="Key is taken" {...register(`${at}.takesKey`)} />
      <TextField
        className="col-span-3 max-[560px]:col-span-2"
        label="Where the key goes back"
        {...register(`${at}.keyGoesBack`)}
        error={errors?.keyGoesBack?.message}
      />
      <TextField
        className="col-span-6 max-[560px]:col-span-2"
        label="Something else to know here"
        {...register(`${at}.mustKnow`)}
        error={errors?.mustKnow?.message}
      />
    </fieldset>
  );
}

export function VehicleMustKnows({ at, register, errors }: Fields & { at: `vehicles.${number}`; errors: Wrong }) {
  return (
    <fieldset className="col-span-6 max-[560px]:col-span-2 grid grid-cols-[auto_1fr] gap-x-6 items-end">
      <legend className="sr">Must-knows of this vehicle</legend>
      <CheckField label="Ceramic coating" {...register(`${at}.isCoated`)} />
      <TextField
        label="Something else to know about it"
        {...register(`${at}.mustKnow`)}
        error={errors?.mustKnow?.message}
      />
    </fieldset>
  );
}
