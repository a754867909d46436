import { useState } from 'react';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { Button } from '../../../components/button.tsx';
import { CheckField, TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Picks } from '../../../components/picks.tsx';

const reasons = ['Weather', 'Out of time', 'Cure time', 'No water', 'Customer asked'];
const spans = [30, 60, 90, 120, 180, 240];

/** Ends a visit with what is finished; the rest goes back to Unplaced with its minutes. */
export function PartDoneSheet({
  visit,
  isBusy,
  error,
  onSend,
  onClose,
}: {
  visit: RunVisitDto;
  isBusy: boolean;
  error: string | undefined;
  onSend: (part: { reason: string; finishedLineIds: string[]; remainingMinutes: number }) => void;
  onClose: () => void;
}) {
  const [finished, setFinished] = useState<string[]>([]);
  const [reason, setReason] = useState('');
  const [minutes, setMinutes] = useState(60);
  const open = visit.lines.filter((line) => !line.isFinished);
  return (
    <Sheet title="Part done" onClose={onClose} width={460}>
      <div className="ph-sheet">
        <fieldset className="mb-3">
          <legend className="sec w-full">Finished today</legend>
          {open.map((line) => (
            <CheckField
              key={line.id}
              label={`${line.serviceName}${line.vehicle ? `, ${line.vehicle}` : ''}`}
              checked={finished.includes(line.id)}
              onChange={(event) =>
                setFinished(event.target.checked ? [...finished, line.id] : finished.filter((id) => id !== line.id))
              }
            />
          ))}
        </fieldset>
        <h3 className="sec">Why the rest is left</h3>
        <Picks options={reasons} value={reason} onPick={setReason} className="grid grid-cols-2 gap-2 my-2" />
        <TextField label="Reason" value={reason} onChange={(event) => setReason(event.target.value)} error={error} />
        <h3 className="sec mt-3">The rest takes about</h3>
        <Picks
          options={spans}
          value={minutes}
          onPick={setMinutes}
          nameOf={(span) => (span < 60 ? `${span} min` : `${span / 60} h`)}
          className="grid grid-cols-3 gap-2 my-2"
        />
      </div>
      <SheetFoot>
        <Button
          look="main"
          isBusy={isBusy}
          disabled={reason.trim() === '' || finished.length === open.length}
          onClick={() => onSend({ reason, finishedLineIds: finished, remainingMinutes: minutes })}
        >
          End with part done
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
