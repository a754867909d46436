import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { customerSearch } from '../api/jobs.queries.ts';

interface CustomerPickProps {
  chosen: CustomerDto | undefined;
  error: string | undefined;
  onChoose: (customer: CustomerDto) => void;
  onClear: () => void;
  onNew: (name: string) => void;
}

/** Finds a customer by any part of name, phone, plate or street; or starts a new one with what was typed. */
export function CustomerPick({ chosen, error, onChoose, onClear, onNew }: CustomerPickProps) {
  const [find, setFind] = useState('');
  const found = useQuery({ ...customerSearch(find.trim()), enabled: chosen === undefined && find.trim().length >= 2 });
  if (chosen) {
    return (
      <div className="flex items-center justify-between gap-3 py-1">
        <p>
          <b className="t-name text-lead">{chosen.name}</b> <span className="t-2">{chosen.phone}</span>
        </p>
        <Button onClick={onClear}>Other customer</Button>
      </div>
    );
  }
  return (
    <div>
      <TextField
        label="Customer"
        autoFocus
        placeholder="Name, phone, plate or street"
        value={find}
        error={error}
        autoComplete="off"
        onChange={(event) => setFind(event.target.value)}
      />
      {found.data ? (
        <ul className="rows mt-1" aria-label="Customers found">
          {found.data.customers.map((customer) => (
            <li key={customer.id}>
              <button type="button" onClick={() => onChoose(customer)}>
                <b>{customer.name}</b>
                <small>{customer.phone}</small>
                <small>{customer.addresses[0]?.line}</small>
              </button>
            </li>
          ))}
        </ul>
      ) : null}
      <div className="mt-2">
        <Button onClick={() => onNew(find.trim())}>
          New customer{find.trim() && found.data?.customers.length === 0 ? ` “${find.trim()}”` : ''}
        </Button>
      </div>
    </div>
  );
}
