import { useId } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useFieldArray, useForm } from 'react-hook-form';
import { zodResolver } from '@hookform/resolvers/zod';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { customerBody } from '@driprail/shared/contracts/customers-record.contract';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { Button } from '../../../components/button.tsx';
import { CheckField, TextArea, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { showRefusal } from '../../../lib/fields.ts';
import { useSaveCustomer, vehicleWordsQuery } from '../api/customers.queries.ts';
import { AddressFields, newAddress } from './address-fields.tsx';
import { ConsentFields } from './consent-fields.tsx';
import { CrewAndTags } from './crew-and-tags.tsx';
import './customer-form.css';
import { CustomerMustKnows } from './must-know-fields.tsx';
import { VehicleFields, newVehicle } from './vehicle-fields.tsx';

interface CustomerFormProps {
  customer: CustomerDto | null;
  name?: string;
  onSaved: (customer: CustomerDto) => void;
  onCancel: () => void;
}

/** A customer with addresses and vehicles. Gate codes reach a crew only on the day. */
export function CustomerForm({ customer, name = '', onSaved, onCancel }: CustomerFormProps) {
  const save = useSaveCustomer();
  const form = useForm<CustomerBody>({
    resolver: zodResolver(customerBody),
    defaultValues: customer ? bodyOf(customer) : emptyBody(name),
  });
  const { register, control, handleSubmit, setError, formState } = form;
  const { errors } = formState;
  const addresses = useFieldArray({ control, name: 'addresses', keyName: 'key' });
  const vehicles = useFieldArray({ control, name: 'vehicles', keyName: 'key' });
  const listId = useId();
  const lists = { makes: `${listId}makes`, models: `${listId}models`, colors: `${listId}colors` };
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
        <TextField label="Name" dir="auto" autoFocus {...register('name')} error={errors.name?.message} />
        <TextField label="Phone" type="tel" {...register('phone')} error={errors.phone?.message} />
        <TextField label="E-mail" inputMode="email" {...register('email')} error={errors.email?.message} />
      </div>
      <CheckField label="A company or fleet" {...register('isCompany')} />
      <h3 className="sec mt-3">Addresses</h3>
      {addresses.fields.map((field, index) => (
        <AddressFields
          key={field.key}
          form={form}
          index={index}
          onRemove={addresses.fields.length > 1 ? () => addresses.remove(index) : null}
        />
      ))}
      <Button className="mt-2" onClick={() => addresses.append(newAddress)}>
        <Icon name="plus" /> Add an address
      </Button>
      <h3 className="sec mt-4">Vehicles</h3>
      {vehicles.fields.map((field, index) => (
        <VehicleFields
          key={field.key}
          form={form}
          index={index}
          lists={lists}
          onRemove={() => vehicles.remove(index)}
        />
      ))}
      <WordLists lists={lists} />
      <Button className="mt-2" onClick={() => vehicles.append(newVehicle)}>
        <Icon name="plus" /> Add a vehicle
      </Button>
      <CustomerMustKnows register={register} errors={errors} />
      <ConsentFields form={form} asked={(customer?.consents ?? []).map(({ channel }) => channel)} />
      <h3 className="sec mt-4">Crew, tags and notes</h3>
      <CrewAndTags form={form} />
      <TextArea label="Notes" dir="auto" rows={4} {...register('notes')} error={errors.notes?.message} />
      {formState.isSubmitted && Object.keys(errors).length > 0 ? (
        <p className="tape mt-3" role="alert">
          <b>{errors.root?.message ?? 'Look at the marked fields. What you typed is still here.'}</b>
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

/** What this company typed before, offered while typing. */
function WordLists({ lists }: { lists: Record<'makes' | 'models' | 'colors', string> }) {
  const words = useQuery(vehicleWordsQuery);
  return (['makes', 'models', 'colors'] as const).map((kind) => (
    <datalist key={kind} id={lists[kind]}>
      {words.data?.[kind].map((word) => (
        <option key={word} value={word} />
      ))}
    </datalist>
  ));
}

/** The form asks for year, make and model; the name made of them is left out. */
function bodyOf({ id: _id, version: _version, vehicles, ...body }: CustomerDto): CustomerBody {
  return { ...body, vehicles: vehicles.map(({ label: _label, ...vehicle }) => vehicle) };
}

function emptyBody(name: string): CustomerBody {
  return {
    ...{ name, isCompany: false, phone: '', email: '', notes: '', isScentFree: false, ringsFirst: false, mustKnow: '' },
    ...{ tags: [], preferredCrew: [], consents: [], addresses: [newAddress], vehicles: [newVehicle] },
  };
}
