import { useState } from 'react';
import type { ReactNode } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextArea, TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Loaded } from '../../../components/states.tsx';
import { money, parseMoney } from '../../../lib/format.ts';
import { useSession } from '../../../lib/session.tsx';
import { useDraft } from '../../../lib/use-draft.ts';
import { customerQuery, jobQuery, menuQuery, useSaveJob } from '../api/jobs.queries.ts';
import { CustomerPick } from './customer-pick.tsx';
import type { JobDraft } from './job-draft.ts';
import { bodyOf, draftOf, emptyDraft, menuPrice, withCustomer } from './job-draft.ts';
import { JobLinesField } from './job-lines-field.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

export interface NewCustomerProps {
  name: string;
  onSaved: (customer: CustomerDto) => void;
  onCancel: () => void;
}
interface JobSheetProps {
  /** Null for a new job. */
  jobId: string | null;
  isCopy: boolean;
  day: string;
  /** The form of another feature, handed in by the page. */
  newCustomer: (props: NewCustomerProps) => ReactNode;
  onClose: () => void;
  onSaved: (job: JobDto) => void;
}

/** Orders a job or changes one. What is typed survives a refusal, and for a new job also a reload. */
export function JobSheet(props: JobSheetProps) {
  const { jobId, isCopy, onClose } = props;
  const job = useQuery({ ...jobQuery(jobId ?? ''), enabled: jobId !== null });
  const title = jobId === null || isCopy ? 'New job' : `Job ${job.data?.job.number ?? ''}`;
  return (
    <Sheet title={title} onClose={onClose} width={860}>
      {jobId === null ? (
        <JobForm {...props} job={null} />
      ) : (
        <Loaded query={job} what="the job">
          {(data) => <JobForm {...props} job={data.job} />}
        </Loaded>
      )}
    </Sheet>
  );
}

function JobForm({ job, isCopy, day, newCustomer, onClose, onSaved }: JobSheetProps & { job: JobDto | null }) {
  const { zone } = useSession().company;
  const isNew = job === null || isCopy;
  const draft = useDraft<JobDraft>(job === null ? 'job-draft' : null, () =>
    job ? draftOf(job, zone, isCopy, day) : emptyDraft(day),
  );
  const { value, set } = draft;
  const [newName, setNewName] = useState<string | null>(null);
  const [unread, setUnread] = useState<Record<string, string>>({});
  const customer = useQuery({ ...customerQuery(value.customerId), enabled: value.customerId !== '' });
  const menu = useQuery(menuQuery);
  const save = useSaveJob();
  const fields = { ...fieldsOf(save.error), ...unread };

  if (newName !== null) {
    return newCustomer({
      name: newName,
      onCancel: () => setNewName(null),
      onSaved: (made) => {
        set(withCustomer(value, made));
        setNewName(null);
      },
    });
  }
  const submit = () => {
    const read = bodyOf(value, zone);
    setUnread('fields' in read ? read.fields : {});
    if ('fields' in read || save.isPending) return;
    save.mutate(
      { id: isNew ? null : (job?.id ?? null), version: job?.version ?? 0, body: read.body },
      {
        onSuccess: ({ job: saved }) => {
          draft.drop();
          onSaved(saved);
        },
      },
    );
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <CustomerPick
        chosen={customer.data?.customer}
        error={fields['customerId']}
        onChoose={(chosen) => set(withCustomer(value, chosen))}
        onClear={() => set({ ...value, customerId: '', addressId: '' })}
        onNew={setNewName}
      />
      {customer.data ? (
        <SelectField
          label="Address"
          className="mt-3"
          value={value.addressId}
          error={fields['addressId']}
          onChange={(event) => set({ ...value, addressId: event.target.value })}
        >
          {customer.data.customer.addresses.map((address) => (
            <option key={address.id} value={address.id}>
              {[address.line, address.area, address.city].filter(Boolean).join(', ')}
            </option>
          ))}
        </SelectField>
      ) : null}
      <div className="grid grid-cols-3 gap-3 my-3 max-[560px]:grid-cols-1">
        <TextField
          label="Promised day"
          type="date"
          value={value.windowDay}
          onChange={(event) => set({ ...value, windowDay: event.target.value })}
        />
        <TextField
          label="Arrival from"
          type="time"
          step={900}
          value={value.windowFrom}
          error={fields['windowFrom']}
          onChange={(event) => set({ ...value, windowFrom: event.target.value })}
        />
        <TextField
          label="Arrival to"
          type="time"
          step={900}
          value={value.windowTo}
          error={fields['windowTo']}
          onChange={(event) => set({ ...value, windowTo: event.target.value })}
        />
      </div>
      <Loaded query={menu} what="the service menu">
        {({ services }) => (
          <>
            <JobLinesField
              lines={value.lines}
              services={services}
              customer={customer.data?.customer}
              fields={fields}
              onChange={(lines) => set({ ...value, lines })}
            />
            <JobTotal draft={value} prices={value.lines.map((line) => menuPrice(services, line))} />
          </>
        )}
      </Loaded>
      <TextArea
        label="Notes for the crew"
        className="mt-3"
        value={value.notes}
        error={fields['notes']}
        onChange={(event) => set({ ...value, notes: event.target.value })}
      />
      <div className="grid grid-cols-[140px_1fr] gap-3 mt-3">
        <TextField
          label="Discount"
          inputMode="decimal"
          placeholder="0.00"
          value={value.discount}
          error={fields['discountCents']}
          onChange={(event) => set({ ...value, discount: event.target.value })}
        />
        <TextField
          label="Reason for the discount"
          value={value.discountReason}
          error={fields['discountReason']}
          onChange={(event) => set({ ...value, discountReason: event.target.value })}
        />
      </div>
      <FormFault error={save.error} fields={fields} className="mt-3" />
      <SheetFoot>
        <Button
          onClick={() => {
            draft.drop();
            onClose();
          }}
        >
          Leave
        </Button>
        <Button type="submit" look="main" isBusy={save.isPending}>
          {isNew ? 'Book the job' : 'Save the job'}
        </Button>
      </SheetFoot>
    </form>
  );
}

function JobTotal({ draft, prices }: { draft: JobDraft; prices: ({ priceCents: number; minutes: number } | null)[] }) {
  const cents = draft.lines.reduce(
    (sum, line, index) => sum + (parseMoney(line.price) ?? prices[index]?.priceCents ?? 0),
    0,
  );
  const minutes = prices.reduce((sum, price) => sum + (price?.minutes ?? 0), 0);
  if (draft.lines.length === 0) return null;
  return (
    <p className="flex justify-between mt-2 pt-1 border-t border-line">
      <span className="t-2">{formatMinutes(minutes)} with one person</span>
      <b>{money(cents - (parseMoney(draft.discount) ?? 0))}</b>
    </p>
  );
}
