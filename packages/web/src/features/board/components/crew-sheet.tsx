import { useState } from 'react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { BoardDto, BoardVanDto } from '@driprail/shared/contracts/board.contract';
import { listPeople, setVanCrew } from '@driprail/shared/contracts/people.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { clockOf } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';

interface Row {
  personId: string;
  from: string;
  to: string;
}

/** Who rides in a van on a day, in crew order; a person rides in one van at a time. */
export function CrewSheet({ board, van, onClose }: { board: BoardDto; van: BoardVanDto; onClose: () => void }) {
  const client = useQueryClient();
  const people = useQuery({ queryKey: ['people'], queryFn: ({ signal }) => call(listPeople, {}, signal) });
  const [rows, setRows] = useState<Row[]>(() =>
    van.crew.map((p) => ({ personId: p.personId, from: clockOf(p.from, board.zone), to: clockOf(p.to, board.zone) })),
  );
  const save = useMutation({
    mutationFn: () =>
      call(setVanCrew, {
        params: { id: van.id, day: board.day },
        body: {
          members: rows.map((row) => ({
            personId: row.personId,
            from: instantOf(board.day, row.from, board.zone),
            to: instantOf(board.day, row.to, board.zone),
          })),
        },
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['board'] }).then(onClose),
  });
  const change = (index: number, next: Partial<Row>) =>
    setRows(rows.map((row, at) => (at === index ? { ...row, ...next } : row)));
  const elsewhere = (personId: string) =>
    board.vans.find((other) => other.id !== van.id && other.crew.some((p) => p.personId === personId));
  return (
    <Sheet title={`${van.name}, crew`} onClose={onClose} width={620}>
      <p className="t-2 mb-3">
        {formatDay(board.day)}. The first is asked first; shares of a tie of a cent go in this order.
      </p>
      <Loaded query={people} what="the people">
        {({ people: list }) => (
          <div className="grid gap-2">
            {rows.map((row, index) => (
              <div
                key={index}
                className="grid grid-cols-[minmax(0,1fr)_110px_110px_40px] gap-2 items-end max-[560px]:grid-cols-2"
              >
                <SelectField
                  label="Person"
                  value={row.personId}
                  onChange={(event) => change(index, { personId: event.target.value })}
                >
                  {list
                    .filter((person) => person.isActive || person.id === row.personId)
                    .map((person) => {
                      const isOff = person.timeOff.some((off) => off.startsOn <= board.day && off.endsOn >= board.day);
                      const other = elsewhere(person.id);
                      return (
                        <option key={person.id} value={person.id}>
                          {person.name}
                          {isOff ? ', day off' : other ? `, in ${other.name}` : ''}
                        </option>
                      );
                    })}
                </SelectField>
                <TextField
                  label="From"
                  type="time"
                  value={row.from}
                  onChange={(event) => change(index, { from: event.target.value })}
                />
                <TextField
                  label="To"
                  type="time"
                  value={row.to}
                  onChange={(event) => change(index, { to: event.target.value })}
                />
                <Button
                  look="bare"
                  aria-label="Take out of the crew"
                  onClick={() => setRows(rows.filter((_, at) => at !== index))}
                >
                  <Icon name="x" />
                </Button>
              </div>
            ))}
            {rows.length === 0 ? <p className="empty">Nobody rides in {van.name} that day.</p> : null}
            <div>
              <Button
                onClick={() => {
                  const free = list.find(
                    (p) => p.isActive && !rows.some((row) => row.personId === p.id) && !elsewhere(p.id),
                  );
                  const person = free ?? list.find((p) => p.isActive);
                  if (person) setRows([...rows, { personId: person.id, from: board.dayStartsAt, to: board.dayEndsAt }]);
                }}
              >
                <Icon name="plus" /> Add a person
              </Button>
            </div>
          </div>
        )}
      </Loaded>
      {save.error ? (
        <p className="tape mt-3" role="alert">
          <b>{save.error.message}</b>
        </p>
      ) : null}
      <SheetFoot>
        <Button look="main" isBusy={save.isPending} onClick={() => save.mutate()}>
          Save crew
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
