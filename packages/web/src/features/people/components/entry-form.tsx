import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { clockKindNames, clockKinds } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockEntryDto } from '@driprail/shared/contracts/clock.contract';
import { addDays, clockOf, dayOf } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { useSession } from '../../../lib/session.tsx';
import { dayVisitsQuery, useProposeChange, useSaveEntry } from '../api/hours.queries.ts';
import { peopleQuery } from '../api/people.queries.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

const picks = ['Forgot to clock out', 'Forgot to clock in', 'Pressed the wrong kind', 'Phone was off'];

/** Corrects or adds a stretch of time. Both versions stay on record; a locked week is mended by a correction in pay. */
export function EntryForm({ entry, day, onDone }: { entry: ClockEntryDto | null; day: string; onDone: () => void }) {
  const { zone } = useSession().company;
  const people = useQuery(peopleQuery);
  const save = useSaveEntry();
  const propose = useProposeChange();
  const [value, setValue] = useState({
    personId: entry?.personId ?? '',
    kind: entry?.kind ?? 'shop',
    visitId: '',
    day: entry ? dayOf(entry.startedAt, zone) : day,
    from: entry ? clockOf(entry.startedAt, zone) : '07:30',
    to: entry?.endedAt ? clockOf(entry.endedAt, zone) : '',
    isInterrupted: entry?.isInterrupted ?? false,
    reason: '',
  });
  const isAtJob = entry === null && (value.kind === 'job' || value.kind === 'travel');
  const visits = useQuery({ ...dayVisitsQuery(value.day), enabled: isAtJob && value.day !== '' });
  const fields = { ...fieldsOf(save.error), ...fieldsOf(propose.error) };
  const spanOf = () => {
    const startedAt =
      entry && clockOf(entry.startedAt, zone) === value.from ? entry.startedAt : instantOf(value.day, value.from, zone);
    // An end before its start by the clock is past midnight.
    const endDay = value.to !== '' && value.to < value.from ? addDays(value.day, 1) : value.day;
    const isSameEnd = entry?.endedAt && clockOf(entry.endedAt, zone) === value.to;
    const endedAt = value.to === '' ? null : isSameEnd ? entry.endedAt : instantOf(endDay, value.to, zone);
    return { kind: value.kind, startedAt, endedAt, isInterrupted: value.isInterrupted };
  };
  const submit = () => {
    const span = { ...spanOf(), reason: value.reason };
    if (save.isPending) return;
    if (entry) save.mutate({ id: entry.id, body: { ...span, version: entry.version } }, { onSuccess: onDone });
    else
      save.mutate(
        {
          id: null,
          body: { ...span, personId: value.personId, visitId: isAtJob && value.visitId !== '' ? value.visitId : null },
        },
        { onSuccess: onDone },
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
      {entry ? (
        <p className="mb-3">
          <b>{entry.personName}</b>
          {entry.jobNumber ? `, job ${entry.jobNumber}` : ''}
        </p>
      ) : (
        <SelectField
          className="mb-3"
          label="Person"
          value={value.personId}
          error={fields['personId']}
          onChange={(event) => setValue({ ...value, personId: event.target.value })}
        >
          <option value="">Choose …</option>
          <NamedOptions of={people.data?.people ?? []} />
        </SelectField>
      )}
      <div className="grid grid-cols-4 gap-3 max-[560px]:grid-cols-2">
        <SelectField
          label="Kind"
          value={value.kind}
          onChange={(event) => setValue({ ...value, kind: event.target.value as ClockKindName })}
        >
          {clockKinds.map((kind) => (
            <option key={kind} value={kind}>
              {clockKindNames[kind]}
            </option>
          ))}
        </SelectField>
        <TextField
          label="Day"
          type="date"
          value={value.day}
          disabled={entry !== null}
          onChange={(event) => setValue({ ...value, day: event.target.value })}
        />
        <TextField
          label="From"
          type="time"
          value={value.from}
          error={fields['startedAt']}
          onChange={(event) => setValue({ ...value, from: event.target.value })}
        />
        <TextField
          label="To"
          type="time"
          value={value.to}
          error={fields['endedAt']}
          hint={value.to === '' ? 'Still running' : undefined}
          onChange={(event) => setValue({ ...value, to: event.target.value })}
        />
      </div>
      {isAtJob ? (
        <SelectField
          className="mt-3"
          label="Job"
          value={value.visitId}
          error={fields['visitId']}
          onChange={(event) => setValue({ ...value, visitId: event.target.value })}
        >
          <option value="">None named</option>
          {visits.data?.map((visit) => (
            <option key={visit.id} value={visit.id}>
              {visit.jobNumber}, {visit.customerName}
              {visit.crew.length > 0 ? ` (${visit.crew.map((member) => member.name).join(', ')})` : ''}
            </option>
          ))}
        </SelectField>
      ) : null}
      {value.kind === 'meal_break' ? (
        <CheckField
          label="Had to work during the break: it counts as worked"
          checked={value.isInterrupted}
          onChange={(event) => setValue({ ...value, isInterrupted: event.target.checked })}
        />
      ) : null}
      <div className="flex flex-wrap gap-2 my-3">
        {picks.map((pick) => (
          <Button key={pick} onClick={() => setValue({ ...value, reason: pick })}>
            {pick}
          </Button>
        ))}
      </div>
      <TextField
        label="Reason"
        value={value.reason}
        error={fields['reason']}
        onChange={(event) => setValue({ ...value, reason: event.target.value })}
      />
      <FormFault error={save.error ?? propose.error} fields={fields} className="mt-3" />
      {propose.isSuccess ? <p role="status">{entry?.personName} is asked; nothing changes before the answer.</p> : null}
      <SheetFoot>
        {entry ? (
          <Button
            isBusy={propose.isPending}
            disabled={value.reason.trim() === '' || propose.isSuccess}
            onClick={() =>
              propose.mutate({ personId: entry.personId, entryId: entry.id, after: spanOf(), reason: value.reason })
            }
          >
            Propose it to {entry.personName}
          </Button>
        ) : null}
        <Button type="submit" look="main" isBusy={save.isPending}>
          {entry ? 'Save the correction' : 'Write it down'}
        </Button>
      </SheetFoot>
    </form>
  );
}
