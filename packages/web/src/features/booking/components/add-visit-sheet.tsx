import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Loaded } from '../../../components/states.tsx';
import { jobQuery, useAddVisit } from '../api/jobs.queries.ts';

/** Another going-out to the job: a second day, a return after cure, or a second crew at the same parking place. */
export function AddVisitSheet({ jobId, visits, onClose }: { jobId: string; visits: VisitDto[]; onClose: () => void }) {
  const job = useQuery(jobQuery(jobId));
  const add = useAddVisit(jobId);
  const [minutes, setMinutes] = useState('60');
  const [lineIds, setLineIds] = useState<string[]>([]);
  const [besideVisitId, setBeside] = useState('');
  return (
    <Sheet title="Add visit" onClose={onClose} width={520}>
      <Loaded query={job} what="the job">
        {({ job: data }) => (
          <div className="grid gap-3">
            <p className="t-2">
              {data.customerName}, job {data.number}. The visit lands on Unplaced.
            </p>
            <TextField
              label="Minutes"
              type="number"
              min={5}
              step={5}
              value={minutes}
              onChange={(event) => setMinutes(event.target.value)}
            />
            <fieldset>
              <legend className="t-2">Work it does</legend>
              {data.lines
                .filter((line) => !line.isFinished)
                .map((line) => (
                  <CheckField
                    key={line.id}
                    label={`${line.serviceName}${line.vehicle ? `, ${line.vehicle}` : ''}`}
                    checked={lineIds.includes(line.id)}
                    onChange={(event) =>
                      setLineIds(event.target.checked ? [...lineIds, line.id] : lineIds.filter((id) => id !== line.id))
                    }
                  />
                ))}
            </fieldset>
            <SelectField
              label="Parking place"
              value={besideVisitId}
              onChange={(event) => setBeside(event.target.value)}
            >
              <option value="">Its own</option>
              {visits
                .filter((visit) => visit.vanId !== null)
                .map((visit) => (
                  <option key={visit.id} value={visit.id}>
                    The same as {visit.customerName}, job {visit.jobNumber}
                  </option>
                ))}
            </SelectField>
          </div>
        )}
      </Loaded>
      {add.error ? (
        <p className="tape mt-3" role="alert">
          {add.error.message}
        </p>
      ) : null}
      <SheetFoot>
        <Button
          look="main"
          isBusy={add.isPending}
          onClick={() =>
            add.mutate(
              { minutes: Number(minutes), lineIds, besideVisitId: besideVisitId || null },
              { onSuccess: onClose },
            )
          }
        >
          Add the visit
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
