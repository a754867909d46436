import { useState } from 'react';
import { useAbility } from '@casl/react';
import { useQuery } from '@tanstack/react-query';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { tag } from '@driprail/shared/authz/ability';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { Button } from '../../../components/button.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Loaded } from '../../../components/states.tsx';
import { billQuery, useIssueInvoice } from '../api/money.queries.ts';
import { BillHead } from './bill-head.tsx';
import { BillLedger } from './bill-ledger.tsx';
import { FeeForm } from './fee-form.tsx';
import { GiveBackForm } from './give-back-form.tsx';
import { PayLink } from './pay-link.tsx';
import { PaymentForm } from './payment-form.tsx';
import './bill-panel.css';

type Task = 'link' | 'payment' | 'back' | 'fee';

/**
 * A job's bill with all that one may do about it. It knows neither list nor board around it.
 * @param isTitled false where what it stands on says already which bill it is
 */
export function BillPanel({ jobId, isTitled = true }: { jobId: string; isTitled?: boolean }) {
  const bill = useQuery(billQuery(jobId));
  return (
    <Loaded query={bill} what="the bill">
      {(data) => <Bill bill={data.bill} isTitled={isTitled} />}
    </Loaded>
  );
}

function Bill({ bill, isTitled }: { bill: BillDto; isTitled: boolean }) {
  const ability = useAbility<AppAbility>();
  const [task, setTask] = useState<Task | null>(null);
  const close = () => setTask(null);
  const seen = tag('Bill', { id: bill.jobId, crewPersonIds: [], day: null, daysFromToday: null });
  const canGiveBack = ability.can('refund', seen) && (bill.invoice !== null || bill.payments.length > 0);
  return (
    <div className="bl">
      <BillHead bill={bill} isTitled={isTitled} />
      {task === null ? (
        <Actions bill={bill} canGiveBack={canGiveBack} onTask={setTask} />
      ) : task === 'link' ? (
        <PayLink jobId={bill.jobId} onDone={close} />
      ) : task === 'payment' ? (
        <PaymentForm bill={bill} onDone={close} />
      ) : task === 'fee' ? (
        <FeeForm bill={bill} onDone={close} />
      ) : (
        <GiveBackForm bill={bill} onDone={close} />
      )}
      <BillLedger bill={bill} />
    </div>
  );
}

function Actions({ bill, canGiveBack, onTask }: { bill: BillDto; canGiveBack: boolean; onTask: (task: Task) => void }) {
  const issue = useIssueInvoice(bill.jobId);
  const canIssue = bill.invoice === null && bill.isDone;
  return (
    <div className="bl-acts no-print">
      {canIssue ? (
        <Button look="main" isBusy={issue.isPending} onClick={() => issue.mutate()}>
          Bill now
        </Button>
      ) : null}
      {bill.invoice === null && bill.isCalledOff ? <Button onClick={() => onTask('fee')}>Bill a fee</Button> : null}
      {bill.owedCents > 0 ? (
        <Button look={canIssue ? 'plain' : 'main'} onClick={() => onTask('payment')}>
          Record a payment
        </Button>
      ) : null}
      <Button onClick={() => onTask('link')}>
        <Icon name="go" /> Customer’s link
      </Button>
      {canGiveBack ? (
        <Button onClick={() => onTask('back')}>
          <Icon name="undo" /> Give back
        </Button>
      ) : null}
      {bill.invoice ? (
        <a className="btn" href={`/api/jobs/${bill.jobId}/invoice.pdf`} download={`invoice-${bill.invoice.number}.pdf`}>
          <Icon name="print" /> Invoice, PDF
        </a>
      ) : null}
      <FormFault error={issue.error} fields={{}} />
    </div>
  );
}
