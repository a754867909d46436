import { useState } from 'react';
import type { PaidJob, UnpaidJob } from '@driprail/shared/contracts/jobs-paid.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../../components/button.tsx';
import { TextField } from '../../../../components/field.tsx';
import { FormError } from '../../../../components/form-error.tsx';
import { Empty } from '../../../../components/states.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { money, useFormats } from '../../../../lib/format.ts';
import { useNow } from '../../../../lib/now.ts';
import { useMarkJobPaid, useTakeBackJobPaid } from '../../api/jobs-paid.queries.ts';

/** Finished jobs that wait for payment, marked one by one on the day the payment became known. */
export function JobsPaidSheet({ waiting, paid }: { waiting: UnpaidJob[]; paid: PaidJob[] }) {
  const { zone } = useFormats();
  const [paidOn, setPaidOn] = useState(dayOf(useNow(), zone));
  const mark = useMarkJobPaid();
  const takeBack = useTakeBackJobPaid();
  return (
    <>
      <TextField
        label="Paid on"
        type="date"
        className="max-w-[220px]"
        value={paidOn}
        error={fieldsOf(mark.error)['paidOn']}
        hint="The commission is settled in the pay week of this day."
        onChange={(event) => setPaidOn(event.target.value)}
      />
      <h3 className="sec mt-4">Not paid for yet</h3>
      {waiting.length === 0 ? <Empty>No finished job waits.</Empty> : null}
      <ul className="dated-list">
        {waiting.map((job) => (
          <li key={job.jobId}>
            <JobWords job={job} />
            <Button
              isBusy={mark.isPending && mark.variables.jobId === job.jobId}
              onClick={() => (mark.isPending ? undefined : mark.mutate({ jobId: job.jobId, paidOn }))}
            >
              Paid in full
            </Button>
          </li>
        ))}
      </ul>
      {paid.length > 0 ? <h3 className="sec mt-4">Paid for lately</h3> : null}
      <ul className="dated-list mb-5">
        {paid.map((job) => (
          <li key={job.jobId}>
            <JobWords job={job} />
            <span>
              Paid {formatDate(job.paidOn)}, {job.recordedBy}
            </span>
            {job.mayTakeBack ? (
              <Button
                isBusy={takeBack.isPending && takeBack.variables === job.jobId}
                onClick={() => takeBack.mutate(job.jobId)}
              >
                Not paid after all
              </Button>
            ) : null}
          </li>
        ))}
      </ul>
      <FormError error={mark.error ?? takeBack.error} />
    </>
  );
}

function JobWords({ job }: { job: UnpaidJob }) {
  return (
    <>
      <b>
        Job {job.jobNumber}, {job.customerName}
      </b>
      <span>
        {money(job.totalCents)}, done {formatDate(job.doneOn)}
      </span>
    </>
  );
}
