import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import type { CallBackCause } from '@driprail/shared/domain/board/call-back';
import { callBackCauseNames, callBackCauses } from '@driprail/shared/domain/board/call-back';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { Button } from '../../../components/button.tsx';
import { CheckField, TextArea, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { Picks } from '../../../components/picks.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useSession } from '../../../lib/session.tsx';
import { jobQuery, useCallBack } from '../api/jobs.queries.ts';

interface CallBackProps {
  jobId: string;
  /** The day that is proposed for it. */
  day: string;
  onClose: () => void;
  onMade: (job: JobDto) => void;
}

/** Sends a crew back to put something right, free to the customer. */
export function CallBackSheet(props: CallBackProps) {
  const job = useQuery(jobQuery(props.jobId));
  return (
    <Sheet title="Call-back" onClose={props.onClose} width={560}>
      <Loaded query={job} what="the job">
        {(data) => <CallBackForm {...props} job={data.job} />}
      </Loaded>
    </Sheet>
  );
}

function CallBackForm({ job, day, onClose, onMade }: CallBackProps & { job: JobDto }) {
  const { zone } = useSession().company;
  const done = job.lines.filter((line) => line.isFinished);
  const [cause, setCause] = useState<CallBackCause | null>(null);
  const [lineIds, setLineIds] = useState(done.length === 1 ? done.map((line) => line.id) : []);
  const [minutes, setMinutes] = useState(30);
  const [notes, setNotes] = useState('');
  const [promise, setPromise] = useState({ day, from: '', to: '' });
  const make = useCallBack(job.id);
  const fields = fieldsOf(make.error);
  const at = (clock: string) => (clock === '' ? null : instantOf(promise.day, clock, zone));
  const isHalf = (promise.from === '') !== (promise.to === '');
  if (done.length === 0) return <Empty>Nothing of this job is finished yet. Change the job itself.</Empty>;
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!cause || isHalf || make.isPending) return;
        make.mutate(
          { cause, lineIds, minutes, notes, windowFrom: at(promise.from), windowTo: at(promise.to) },
          { onSuccess: (answer) => onMade(answer.job) },
        );
      }}
    >
      <p className="mb-3">
        <b>{job.customerName}</b>, job {job.number}. It costs the customer nothing and lands on Unplaced; who did the
        work stands in its notes.
      </p>
      <h3 className="sec">What is wrong</h3>
      <Picks
        options={callBackCauses}
        value={cause}
        onPick={setCause}
        nameOf={(one) => callBackCauseNames[one]}
        className="grid grid-cols-2 gap-2 my-2 max-[480px]:grid-cols-1"
      />
      <h3 className="sec mt-3">What has to be put right</h3>
      {done.map((line) => (
        <CheckField
          key={line.id}
          label={[line.serviceName, line.vehicle].filter(Boolean).join(', ')}
          checked={lineIds.includes(line.id)}
          onChange={(event) =>
            setLineIds(event.target.checked ? [...lineIds, line.id] : lineIds.filter((other) => other !== line.id))
          }
        />
      ))}
      {fields['lineIds'] ? <p className="tape mt-2">{fields['lineIds']}</p> : null}
      <div className="grid grid-cols-4 gap-3 mt-3 max-[480px]:grid-cols-2">
        <TextField
          label="Minutes"
          type="number"
          value={minutes}
          error={fields['minutes']}
          onChange={(event) => setMinutes(Number(event.target.value))}
        />
        <TextField
          label="Promised for"
          type="date"
          value={promise.day}
          onChange={(event) => setPromise({ ...promise, day: event.target.value })}
        />
        <TextField
          label="From"
          type="time"
          value={promise.from}
          onChange={(event) => setPromise({ ...promise, from: event.target.value })}
        />
        <TextField
          label="To"
          type="time"
          value={promise.to}
          error={isHalf ? 'Give both times, or none.' : fields['windowTo']}
          onChange={(event) => setPromise({ ...promise, to: event.target.value })}
        />
      </div>
      <TextArea
        className="mt-3"
        label="Notes for the crew"
        value={notes}
        error={fields['notes']}
        onChange={(event) => setNotes(event.target.value)}
      />
      <FormFault error={make.error} fields={fields} className="mt-3" />
      <SheetFoot>
        <Button onClick={onClose}>Leave</Button>
        <Button
          type="submit"
          look="main"
          isBusy={make.isPending}
          disabled={cause === null || lineIds.length === 0 || isHalf}
        >
          Book the call-back
        </Button>
      </SheetFoot>
    </form>
  );
}
