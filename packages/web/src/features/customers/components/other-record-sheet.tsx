import { useDeferredValue, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { TextField } from '../../../components/field.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Empty } from '../../../components/states.tsx';
import { othersQuery } from '../api/merge.queries.ts';

/** Chooses the record that goes into this one. */
export function OtherRecordSheet({
  customer,
  onChoose,
  onClose,
}: {
  customer: CustomerDto;
  onChoose: (id: string) => void;
  onClose: () => void;
}) {
  const [find, setFind] = useState('');
  const found = useQuery(othersQuery(useDeferredValue(find.trim())));
  const others = found.data?.customers.filter(({ id }) => id !== customer.id);
  return (
    <Sheet
      title={
        <>
          Merge into <bdi>{customer.name}</bdi>
        </>
      }
      onClose={onClose}
      width={560}
    >
      <TextField
        label="The other record of this customer"
        autoFocus
        placeholder="Name, phone, plate or street"
        value={find}
        onChange={({ target }) => setFind(target.value)}
        error={found.error?.message}
      />
      <ul className="rows mt-2 mb-4" aria-label="Customers found">
        {others?.map(({ id, name, phone, addresses }) => (
          <li key={id}>
            <button type="button" onClick={() => onChoose(id)}>
              <b dir="auto">{name}</b>
              <small>{phone}</small>
              <small>{addresses[0]?.line}</small>
            </button>
          </li>
        ))}
      </ul>
      {others?.length === 0 ? <Empty>Nobody else found for “{find.trim()}”.</Empty> : null}
    </Sheet>
  );
}
