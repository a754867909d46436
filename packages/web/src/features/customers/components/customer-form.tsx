import { useFieldArray, useForm } from 'react-hook-form';
import { zodResolver } from '@hookform/resolvers/zod';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { customerBody } from '@driprail/shared/contracts/customers-record.contract';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { sizeClassNames, sizeClasses } from '@driprail/shared/contracts/fields';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextArea, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { showRefusal } from '../../../lib/fields.ts';
import { useSaveCustomer } from '../api/customers.queries.ts';
import { AddressMustKnows, CustomerMustKnows, VehicleMustKnows } from './must-know-fields.tsx';

interface CustomerFormProps {
  customer: CustomerDto | null;
  name?: string;
  onSaved: (customer: CustomerDto) => void;
  onCancel: () => void;
}

const address = {
  line: '',
  city: '',
  postcode: '',
  area: '',
  lat: null,
  lng: null,
  gateCode: '',
  accessNotes: '',
  hasWater: false,
  hasPower: false,
  hasDog: false,
  shutsGate: false,
  drain: 'unknown' as const,
  takesKey: false,
  keyGoesBack: '',
  mustKnow: '',
};
const vehicle = {
  label: '',
  color: '',
  plate: '',
  sizeClass: 'sedan' as const,
  notes: '',
  isCoated: false,
  mustKnow: '',
};

const noMustKnows = { isScentFree: false, ringsFirst: false, mustKnow: '' };

/** A customer with addresses and vehicles. Gate codes reach a crew only on the day. */
export function CustomerForm({ customer, name = '', onSaved, onCancel }: CustomerFormProps) {
  const save = useSaveCustomer();
  const form = useForm<CustomerBody>({
    resolver: zodResolver(customerBody),
    defaultValues: customer
      ? bodyOf(customer)
      : {
          name,
          isCompany: false,
          phone: '',
          email: '',
          notes: '',
          ...noMustKnows,
          addresses: [address],
          vehicles: [vehicle],
        },
  });
  const { register, control, handleSubmit, setError, formState } = form;
  const { errors } = formState;
  const addresses = useFieldArray({ control, name: 'addresses', keyName: 'key' });
  const vehicles = useFieldArray({ control, name: 'vehicles', keyName: 'key' });
  const submit = handleSubmit(async (body) => {
    try {
      onSaved((await save.mutateAsync({ id: customer?.id ?? null, version: customer?.version ?? 0, body })).customer);
    } catch (error) {
      setError('root', { message: showRefusal(error, setError) });
    }
  });
  return (
    <form
      noValidate
      onSubmit={(event) => {
        // Inside the job's form: only this one is sent.
        event.stopPropagation();
        void submit(event);
      }}
    >
      <div className="grid grid-cols-3 gap-3 max-[560px]:grid-cols-1">
        <TextField label="Name" autoFocus {...register('name')} error={errors.name?.message} />
        <TextField label="Phone" type="tel" {...register('phone')} error={errors.phone?.message} />
        <TextField label="E-mail" type="email" {...register('email')} error={errors.email?.message} />
      </div>
      <CheckField label="A company or fleet" {...register('isCompany')} />
      <h3 className="sec mt-3">Addresses</h3>
      {addresses.fields.map((field, index) => {
        const at = `addresses.${index}` as const;
        const wrong = errors.addresses?.[index];
        return (
          <div
            key={field.key}
            className="grid grid-cols-6 gap-x-3 gap-y-2 py-3 border-b border-line items-end max-[560px]:grid-cols-2"
          >
            <TextField
              className="col-span-3 max-[560px]:col-span-2"
              label="Street and number"
              {...register(`${at}.line`)}
              error={wrong?.line?.message}
            />
            <TextField label="Area" {...register(`${at}.area`)} error={wrong?.area?.message} />
            <TextField label="Town" {...register(`${at}.city`)} error={wrong?.city?.message} />
            <TextField label="Zip" {...register(`${at}.postcode`)} error={wrong?.postcode?.message} />
            <TextField label="Gate code" {...register(`${at}.gateCode`)} error={wrong?.gateCode?.message} />
            <TextField
              className="col-span-3 max-[560px]:col-span-1"
              label="Access notes for the crew"
              {...register(`${at}.accessNotes`)}
              error={wrong?.accessNotes?.message}
            />
            <CheckField label="Spigot" {...register(`${at}.hasWater`)} />
            <CheckField label="Outlet" {...register(`${at}.hasPower`)} />
            <AddressMustKnows at={at} register={register} errors={wrong} />
            {addresses.fields.length > 1 ? (
              <Button look="bare" onClick={() => addresses.remove(index)}>
                Take this address off
              </Button>
            ) : null}
          </div>
        );
      })}
      <Button className="mt-2" onClick={() => addresses.append(address)}>
        <Icon name="plus" /> Add an address
      </Button>
      <h3 className="sec mt-4">Vehicles</h3>
      {vehicles.fields.map((field, index) => {
        const at = `vehicles.${index}` as const;
        const wrong = errors.vehicles?.[index];
        return (
          <div
            key={field.key}
            className="grid grid-cols-[1.4fr_1fr_1fr_1.2fr_1.6fr_auto] gap-x-3 gap-y-2 py-3 border-b border-line items-end max-[720px]:grid-cols-2"
          >
            <TextField
              label="Vehicle"
              placeholder="2019 hatchback"
              {...register(`${at}.label`)}
              error={wrong?.label?.message}
            />
            <TextField label="Color" {...register(`${at}.color`)} error={wrong?.color?.message} />
            <TextField label="Plate" {...register(`${at}.plate`)} error={wrong?.plate?.message} />
            <SelectField label="Size class" {...register(`${at}.sizeClass`)} error={wrong?.sizeClass?.message}>
              {sizeClasses.map((size) => (
                <option key={size} value={size}>
                  {sizeClassNames[size]}
                </option>
              ))}
            </SelectField>
            <TextField label="Notes" {...register(`${at}.notes`)} error={wrong?.notes?.message} />
            <Button look="bare" aria-label="Take this vehicle off" onClick={() => vehicles.remove(index)}>
              <Icon name="x" />
            </Button>
            <VehicleMustKnows at={at} register={register} errors={wrong} />
          </div>
        );
      })}
      <Button className="mt-2" onClick={() => vehicles.append(vehicle)}>
        <Icon name="plus" /> Add a vehicle
      </Button>
      <CustomerMustKnows register={register} errors={errors} />
      <TextArea className="mt-4" label="Notes" {...register('notes')} error={errors.notes?.message} />
      {errors.root?.message ? (
        <p className="tape mt-3" role="alert">
          <b>{errors.root.message}</b>
        </p>
      ) : null}
      <SheetFoot>
        <Button onClick={onCancel}>Leave</Button>
        <Button type="submit" look="main" isBusy={save.isPending}>
          {customer ? 'Save customer' : 'Add customer'}
        </Button>
      </SheetFoot>
    </form>
  );
}

function bodyOf({ id: _id, version: _version, ...body }: CustomerDto): CustomerBody {
  return body;
}
