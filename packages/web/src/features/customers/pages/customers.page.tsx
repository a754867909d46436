import { useState } from 'react';
import { useNavigate, useParams } from 'react-router';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { CustomerForm } from '../components/customer-form.tsx';
import { CustomerList } from '../components/customer-list.tsx';
import { CustomerRecord } from '../components/customer-record.tsx';
import './customers.css';

/** Who is edited, or the name a new customer begins with. */
type Editing = { customer: CustomerDto } | { name: string };

/** Households and fleets: a list found by any part of what is known, and one whole record beside it. */
export function CustomersPage() {
  const { id } = useParams();
  const navigate = useNavigate();
  const [editing, setEditing] = useState<Editing | null>(null);
  const customer = editing && 'customer' in editing ? editing.customer : null;
  return (
    <>
      <PageHead
        title="Customers"
        above="Households and fleets"
        actions={
          <Button look="main" onClick={() => setEditing({ name: '' })}>
            <Icon name="plus" /> New customer
          </Button>
        }
      />
      <RailPage>
        <div className={id ? 'beside cu-page is-open' : 'beside cu-page'}>
          <CustomerList chosenId={id} onNew={(name) => setEditing({ name })} />
          {id ? (
            <CustomerRecord key={id} id={id} onEdit={(one) => setEditing({ customer: one })} />
          ) : (
            <p className="empty max-[900px]:hidden">Choose a customer to see addresses, vehicles and past jobs.</p>
          )}
        </div>
      </RailPage>
      {editing ? (
        <Sheet title={customer?.name ?? 'New customer'} onClose={() => setEditing(null)} width={980}>
          <CustomerForm
            customer={customer}
            name={'name' in editing ? editing.name : ''}
            onCancel={() => setEditing(null)}
            onSaved={(saved) => {
              setEditing(null);
              void navigate(paths.customer(saved.id));
            }}
          />
        </Sheet>
      ) : null}
    </>
  );
}
