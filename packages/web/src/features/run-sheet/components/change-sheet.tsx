import { useState } from 'react';
import { clockKindNames, clockKinds } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockEntryDto } from '@driprail/shared/contracts/clock.contract';
import { addDays, clockOf, dayOf } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useFormats } from '../../../lib/format.ts';
import { useAskChange } from '../api/own-hours.queries.ts';
import { Picks } from '../../../components/picks.tsx';

const reasons = ['Forgot to clock out', 'Forgot to press', 'Wrong kind', 'Break was shorter', 'Phone was off'];

/** Asks dispatch to change an entry. Nothing changes before they agree, and both versions stay. */
export function ChangeSheet({ entry, onClose }: { entry: ClockEntryDto; onClose: () => void }) {
  const { zone } = useFormats();
  const ask = useAskChange();
  const day = dayOf(entry.startedAt, zone);
  const [kind, setKind] = useState(entry.kind);
  const [from, setFrom] = useState(clockOf(entry.startedAt, zone));
  const [to, setTo] = useState(entry.endedAt ? clockOf(entry.endedAt, zone) : '');
  const [reason, setReason] = useState('');
  const fields = fieldsOf(ask.error);
  const submit = () => {
    const endDay = to !== '' && to < from ? addDays(day, 1) : day;
    const after = {
      kind,
      startedAt: instantOf(day, from, zone),
      endedAt: to === '' ? null : instantOf(endDay, to, zone),
      isInterrupted: entry.isInterrupted,
    };
    if (!ask.isPending)
      ask.mutate({ personId: entry.personId, entryId: entry.id, after, reason }, { onSuccess: onClose });
  };
  return (
    <Sheet title="Not right" onClose={onClose} width={460}>
      <div className="ph-sheet grid gap-3">
        <SelectField label="Kind" value={kind} onChange={(event) => setKind(event.target.value as ClockKindName)}>
          {clockKinds.map((value) => (
            <option key={value} value={value}>
              {clockKindNames[value]}
            </option>
          ))}
        </SelectField>
        <div className="grid grid-cols-2 gap-3">
          <TextField
            label="From"
            type="time"
            value={from}
            error={fields['startedAt']}
            onChange={(event) => setFrom(event.target.value)}
          />
          <TextField
            label="To"
            type="time"
            value={to}
            error={fields['endedAt']}
            onChange={(event) => setTo(event.target.value)}
          />
        </div>
        <Picks options={reasons} value={reason} onPick={setReason} className="grid grid-cols-2 gap-2" />
        <TextField
          label="Reason"
          value={reason}
          error={fields['reason']}
          onChange={(event) => setReason(event.target.value)}
        />
        <FormFault error={ask.error} fields={fields} />
      </div>
      <SheetFoot>
        <Button look="main" isBusy={ask.isPending} disabled={reason.trim() === '' || from === ''} onClick={submit}>
          Ask dispatch
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
