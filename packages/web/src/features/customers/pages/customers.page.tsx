import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { CustomerMessages } from '../../messages/index.ts';
import { duplicatesQuery } from '../api/merge.queries.ts';
import { CustomerForm } from '../components/customer-form.tsx';
import { CustomerList } from '../components/customer-list.tsx';
import { CustomerRecord } from '../components/customer-record.tsx';
import { DuplicatesSheet } from '../components/duplicates-sheet.tsx';
import { EraseSheet } from '../components/erase-sheet.tsx';
import { MergeSheet } from '../components/merge-sheet.tsx';
import { OtherRecordSheet } from '../components/other-record-sheet.tsx';
import './customer-sheets.css';
import './customers.css';

/** What is open over the page. */
type Open =
  | { kind: 'form'; customer: CustomerDto | null; name: string }
  | { kind: 'duplicates' }
  | { kind: 'other'; customer: CustomerDto }
  | { kind: 'merge'; ids: [string, string] }
  | { kind: 'erase'; id: string };

/** Households and fleets: a list found by any part of what is known, and one whole record beside it. */
export function CustomersPage() {
  const { id } = useParams();
  const navigate = useNavigate();
  const [open, setOpen] = useState<Open | null>(null);
  const duplicates = useQuery(duplicatesQuery);
  const pairs = duplicates.data?.pairs.length ?? 0;
  const close = () => setOpen(null);
  const show = (one: string) => {
    close();
    void navigate(paths.customer(one));
  };
  return (
    <>
      <PageHead
        title="Customers"
        above="Households and fleets"
        actions={
          <>
            <Link className="btn" to={paths.dueAgain}>
              Due again
            </Link>
            <Button onClick={() => setOpen({ kind: 'duplicates' })}>
              Likely duplicates{pairs > 0 ? ` (${pairs})` : ''}
            </Button>
            <Button look="main" onClick={() => setOpen({ kind: 'form', customer: null, name: '' })}>
              <Icon name="plus" /> New customer
            </Button>
          </>
        }
      />
      <RailPage>
        <div className={id ? 'beside cu-page is-open' : 'beside cu-page'}>
          <CustomerList chosenId={id} onNew={(name) => setOpen({ kind: 'form', customer: null, name })} />
          {id ? (
            <CustomerRecord
              key={id}
              id={id}
              messages={<CustomerMessages customerId={id} />}
              onEdit={(customer) => setOpen({ kind: 'form', customer, name: customer.name })}
              onErase={(customer) => setOpen({ kind: 'erase', id: customer.id })}
              onMerge={(customer) => setOpen({ kind: 'other', customer })}
            />
          ) : (
            <p className="empty max-[900px]:hidden">Choose a customer to see addresses, vehicles and past jobs.</p>
          )}
        </div>
      </RailPage>
      {open?.kind === 'form' ? (
        <Sheet title={open.customer?.name ?? 'New customer'} onClose={close} width={980}>
          <CustomerForm
            customer={open.customer}
            name={open.name}
            onCancel={close}
            onSaved={(saved) => show(saved.id)}
          />
        </Sheet>
      ) : null}
      {open?.kind === 'duplicates' ? (
        <DuplicatesSheet onMerge={(ids) => setOpen({ kind: 'merge', ids })} onClose={close} />
      ) : null}
      {open?.kind === 'other' ? (
        <OtherRecordSheet
          customer={open.customer}
          onChoose={(goesId) => setOpen({ kind: 'merge', ids: [open.customer.id, goesId] })}
          onClose={close}
        />
      ) : null}
      {open?.kind === 'erase' ? <EraseSheet id={open.id} onErased={() => show(open.id)} onClose={close} /> : null}
      {open?.kind === 'merge' ? <MergeSheet ids={open.ids} onMerged={show} onClose={close} /> : null}
    </>
  );
}
