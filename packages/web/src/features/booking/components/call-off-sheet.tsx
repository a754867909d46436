import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { jobQuery, useCallOff } from '../api/jobs.queries.ts';

const picks = ['Customer called it off', 'Weather', 'Nobody home', 'Van trouble', 'Booked twice'];

/** Calls a job off with a reason; what was done stays. */
export function CallOffSheet({ jobId, onClose }: { jobId: string; onClose: () => void }) {
  const [reason, setReason] = useState('');
  const job = useQuery(jobQuery(jobId));
  const callOff = useCallOff(jobId);
  return (
    <Sheet title="Call off" onClose={onClose} width={480}>
      <p className="mb-3">
        <b>{job.data?.job.customerName}</b>, job {job.data?.job.number}. Visits that have not been worked leave the day.
      </p>
      <div className="flex flex-wrap gap-2 mb-3">
        {picks.map((pick) => (
          <Button key={pick} onClick={() => setReason(pick)}>
            {pick}
          </Button>
        ))}
      </div>
      <TextField
        label="Reason"
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        error={callOff.error?.message}
      />
      <SheetFoot>
        <Button onClick={onClose}>Keep the job</Button>
        <Button
          look="main"
          isBusy={callOff.isPending}
          disabled={reason.trim() === '' || !job.data}
          onClick={() => callOff.mutate({ version: job.data?.job.version ?? 0, reason }, { onSuccess: onClose })}
        >
          Call the job off
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
