import type { UseFormReturn } from 'react-hook-form';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { drainNames, drains, washWaterNames, washWaters } from '@driprail/shared/domain/customer/place-facts';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useFindPlace } from '../api/customers.queries.ts';
import { AddressMustKnows } from './must-know-fields.tsx';

interface AddressFieldsProps {
  form: UseFormReturn<CustomerBody>;
  index: number;
  onRemove: (() => void) | null;
}

export const newAddress: CustomerBody['addresses'][number] = {
  ...{ label: '', line: '', city: '', postcode: '', area: '', lat: null, lng: null, gateCode: '', accessNotes: '' },
  ...{ hasWater: false, hasPower: false, hasDog: false, shutsGate: false, takesKey: false, keyGoesBack: '' },
  ...{
    drain: 'unknown',
    washWater: null,
    permitNumber: '',
    permitUntil: null,
    ownerConsentBy: '',
    ownerConsentOn: null,
  },
  mustKnow: '',
};

const orNull = (text: string | null) => (text === '' ? null : text);

/** One address: where it is, how to get in, and what becomes of the wash water. */
export function AddressFields({ form, index, onRemove }: AddressFieldsProps) {
  const { register, formState } = form;
  const at = `addresses.${index}` as const;
  const wrong = formState.errors.addresses?.[index];
  return (
    <fieldset className="cu-part">
      <legend className="sr">Address {index + 1}</legend>
      <TextField label="Called" placeholder="Home" {...register(`${at}.label`)} error={wrong?.label?.message} />
      <TextField className="is-2" label="Street and number" {...register(`${at}.line`)} error={wrong?.line?.message} />
      <TextField label="Area" {...register(`${at}.area`)} error={wrong?.area?.message} />
      <TextField label="Town" {...register(`${at}.city`)} error={wrong?.city?.message} />
      <TextField label="Zip" {...register(`${at}.postcode`)} error={wrong?.postcode?.message} />
      <PlaceOnMap form={form} index={index} />
      <TextField label="Gate code" {...register(`${at}.gateCode`)} error={wrong?.gateCode?.message} />
      <TextField
        className="is-4"
        label="Access notes for the crew, shown on the day"
        {...register(`${at}.accessNotes`)}
        error={wrong?.accessNotes?.message}
      />
      <CheckField label="Own water (spigot)" {...register(`${at}.hasWater`)} />
      <CheckField label="Own power (outlet)" {...register(`${at}.hasPower`)} />
      <SelectField
        className="is-2"
        label="The drain leads"
        {...register(`${at}.drain`)}
        error={wrong?.drain?.message}
        hint="What may go into it is for the local code to say."
      >
        {drains.map((drain) => (
          <option key={drain} value={drain}>
            {drainNames[drain]}
          </option>
        ))}
      </SelectField>
      <SelectField
        className="is-2"
        label="Wash water"
        {...register(`${at}.washWater`, { setValueAs: orNull })}
        error={wrong?.washWater?.message}
      >
        <option value="">Not decided</option>
        {washWaters.map((way) => (
          <option key={way} value={way}>
            {washWaterNames[way]}
          </option>
        ))}
      </SelectField>
      <TextField label="Permit number" {...register(`${at}.permitNumber`)} error={wrong?.permitNumber?.message} />
      <TextField
        label="Permit until"
        type="date"
        {...register(`${at}.permitUntil`, { setValueAs: orNull })}
        error={wrong?.permitUntil?.message}
      />
      <TextField
        className="is-2"
        label="Who agreed to work there"
        placeholder="Owner or manager of the place"
        {...register(`${at}.ownerConsentBy`)}
        error={wrong?.ownerConsentBy?.message}
      />
      <TextField
        label="Agreed on"
        type="date"
        {...register(`${at}.ownerConsentOn`, { setValueAs: orNull })}
        error={wrong?.ownerConsentOn?.message}
      />
      {onRemove ? (
        <Button look="bare" className="justify-self-start" onClick={onRemove}>
          Take this address off
        </Button>
      ) : null}
      <AddressMustKnows at={at} register={register} errors={wrong} />
    </fieldset>
  );
}

const degrees = (text: string | number | null) => (text === '' || text === null ? null : Number(text));

function PlaceOnMap({ form, index }: Omit<AddressFieldsProps, 'onRemove'>) {
  const place = useFindPlace();
  const { register, setValue, setError, clearErrors, getValues } = form;
  const at = `addresses.${index}` as const;
  const wrong = form.formState.errors.addresses?.[index];
  const find = async () => {
    const { line, city, postcode } = getValues(at);
    clearErrors([`${at}.line`, `${at}.lat`]);
    try {
      const found = await place.mutateAsync({ line, city, postcode });
      for (const key of ['lat', 'lng'] as const) setValue(`${at}.${key}`, found[key], { shouldDirty: true });
    } catch (error) {
      const fault = fieldsOf(error instanceof Error ? error : null)['line'];
      if (fault) setError(`${at}.line`, { message: fault });
      else setError(`${at}.lat`, { message: error instanceof Error ? error.message : 'The map was not reached.' });
    }
  };
  return (
    <>
      <TextField
        label="Latitude"
        inputMode="decimal"
        {...register(`${at}.lat`, { setValueAs: degrees })}
        error={wrong?.lat?.message}
      />
      <TextField
        label="Longitude"
        inputMode="decimal"
        {...register(`${at}.lng`, { setValueAs: degrees })}
        error={wrong?.lng?.message}
      />
      <div className="is-3 cu-map">
        <Button isBusy={place.isPending} onClick={() => void find()}>
          <Icon name="map" /> Find on the map
        </Button>
        <span className="t-3">Drives go by it. Change the numbers where the map is wrong.</span>
      </div>
    </>
  );
}
