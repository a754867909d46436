import type { UseFormReturn } from 'react-hook-form';
import { useWatch } from 'react-hook-form';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { sizeClassNames, sizeClasses } from '@driprail/shared/contracts/fields';
import { modelYear } from '@driprail/shared/domain/vehicle/model-year';
import { readVin } from '@driprail/shared/domain/vehicle/vin';
import { wheelFinishNames, wheelFinishes } from '@driprail/shared/domain/vehicle/wheel-finish';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { VehicleMustKnows } from './must-know-fields.tsx';

interface VehicleFieldsProps {
  form: UseFormReturn<CustomerBody>;
  index: number;
  /** Ids of the lists of what was typed before. */
  lists: Record<'makes' | 'models' | 'colors', string>;
  onRemove: () => void;
}

export const newVehicle: CustomerBody['vehicles'][number] = {
  ...{ year: null, make: '', model: '', color: '', plate: '', vin: '', sizeClass: 'sedan', wheelFinish: 'unsure' },
  ...{ paint: '', interior: '', notes: '', isCoated: false, mustKnow: '' },
};

const yearOf = (text: string | number | null) => (text === '' || text === null ? null : Number(text));

/** One vehicle: what it is called, its plate and VIN, and what paint, wheels and seats need. */
export function VehicleFields({ form, index, lists, onRemove }: VehicleFieldsProps) {
  const { register, formState } = form;
  const at = `vehicles.${index}` as const;
  const wrong = formState.errors.vehicles?.[index];
  return (
    <fieldset className="cu-part">
      <legend className="sr">Vehicle {index + 1}</legend>
      <TextField
        label="Year"
        inputMode="numeric"
        {...register(`${at}.year`, { setValueAs: yearOf })}
        error={wrong?.year?.message}
      />
      <TextField label="Make" list={lists.makes} {...register(`${at}.make`)} error={wrong?.make?.message} />
      <TextField
        className="is-2"
        label="Model"
        placeholder="hatchback"
        list={lists.models}
        {...register(`${at}.model`)}
        error={wrong?.model?.message}
      />
      <TextField label="Color" list={lists.colors} {...register(`${at}.color`)} error={wrong?.color?.message} />
      <TextField label="Plate" {...register(`${at}.plate`)} error={wrong?.plate?.message} />
      <SelectField
        className="is-2"
        label="Size class"
        {...register(`${at}.sizeClass`)}
        error={wrong?.sizeClass?.message}
      >
        {sizeClasses.map((size) => (
          <option key={size} value={size}>
            {sizeClassNames[size]}
          </option>
        ))}
      </SelectField>
      <SelectField
        className="is-2"
        label="Wheel finish"
        {...register(`${at}.wheelFinish`)}
        error={wrong?.wheelFinish?.message}
      >
        {wheelFinishes.map((finish) => (
          <option key={finish} value={finish}>
            {wheelFinishNames[finish]}
          </option>
        ))}
      </SelectField>
      <Vin form={form} index={index} />
      <TextField className="is-2" label="Paint" {...register(`${at}.paint`)} error={wrong?.paint?.message} />
      <TextField className="is-2" label="Interior" {...register(`${at}.interior`)} error={wrong?.interior?.message} />
      <TextField className="is-2" label="Notes" {...register(`${at}.notes`)} error={wrong?.notes?.message} />
      <VehicleMustKnows at={at} register={register} errors={wrong} />
      <Button look="bare" className="justify-self-start" onClick={onRemove}>
        Take this vehicle off
      </Button>
    </fieldset>
  );
}

/** The number is read while it is typed; what is odd about it is said, and kept all the same. */
function Vin({ form, index }: Pick<VehicleFieldsProps, 'form' | 'index'>) {
  const at = `vehicles.${index}` as const;
  const [vin, year] = useWatch({ control: form.control, name: [`${at}.vin`, `${at}.year`] });
  const reading = readVin(vin ?? '');
  const read = reading.kind === 'checked' && reading.isValid ? modelYear(reading.normalised) : null;
  return (
    <div className="is-2">
      <TextField
        label="VIN"
        autoCapitalize="characters"
        {...form.register(`${at}.vin`)}
        error={form.formState.errors.vehicles?.[index]?.vin?.message}
        hint={
          <span role="status">
            {wordsOf(reading)}
            {read === null ? '' : ` Model year ${read}.`}
          </span>
        }
      />
      {read === null || read === year ? null : (
        <Button look="bare" onClick={() => form.setValue(`${at}.year`, read, { shouldDirty: true })}>
          Take {read} as the year
        </Button>
      )}
    </div>
  );
}

function wordsOf(reading: ReturnType<typeof readVin>): string {
  if (reading.kind === 'empty') return '17 letters and digits. Old and imported vehicles may have others.';
  if (reading.kind === 'malformed')
    return `Not a usual VIN: ${reading.reason}. It is kept as it is; 17 letters and digits without I, O and Q are usual.`;
  return reading.isValid
    ? 'The check digit is right (49 CFR 565).'
    : `The check digit would be ${reading.shouldBe}. Look at the number again; it is kept as it is.`;
}
