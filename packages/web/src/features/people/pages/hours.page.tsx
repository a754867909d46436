import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockEntryDto } from '@driprail/shared/contracts/clock.contract';
import { formatDay, formatMinutes } from '@driprail/shared/domain/time/format';
import { addDays, dayOf, minutesBetween } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { Icon, Mark } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { useFormats } from '../../../lib/format.ts';
import { useNow } from '../../../lib/now.ts';
import { hoursQuery } from '../api/hours.queries.ts';
import { EntryForm } from '../components/entry-form.tsx';
import { HoursRequests } from '../components/hours-requests.tsx';
import { HoursWords } from '../components/hours-words.tsx';

/** The clock of a day, everybody's: hours, never money. The address may name the day and an entry to open. */
export function HoursPage() {
  const format = useFormats();
  const now = useNow();
  const today = dayOf(now, format.zone);
  const [search, setSearch] = useSearchParams();
  const asked = search.get('day') ?? '';
  const day = /^\d{4}-\d{2}-\d{2}$/.test(asked) ? asked : today;
  const setDay = (next: string) => setSearch({ day: next }, { replace: true });
  const [picked, setEditing] = useState<ClockEntryDto | 'new' | null>(null);
  const hours = useQuery(hoursQuery(day, day));
  const entries = hours.data?.entries ?? [];
  const editing = picked ?? entries.find((entry) => entry.id === search.get('entry')) ?? null;
  const close = () => {
    setEditing(null);
    if (search.has('entry')) setDay(day);
  };
  const running = entries.filter((entry) => entry.endedAt === null).length;
  return (
    <>
      <PageHead
        title="Hours"
        above={
          <>
            <button type="button" aria-label="Day before" onClick={() => setDay(addDays(day, -1))}>
              <Icon name="left" />
            </button>
            {formatDay(day)}
            <button type="button" aria-label="Day after" onClick={() => setDay(addDays(day, 1))}>
              <Icon name="right" />
            </button>
          </>
        }
        sums={[
          { label: 'On the clock', value: running },
          { label: 'People', value: new Set(entries.map((entry) => entry.personId)).size },
        ]}
        actions={
          <Button onClick={() => setEditing('new')}>
            <Icon name="plus" /> Write down time
          </Button>
        }
      />
      <RailPage>
        <HoursRequests />
        <div className="hung p-5 max-w-[1100px]">
          <Loaded query={hours} what="the hours">
            {() =>
              entries.length === 0 ? (
                <Empty>Nobody was on the clock that day.</Empty>
              ) : (
                <PeopleHours entries={entries} now={now} onEdit={setEditing} />
              )
            }
          </Loaded>
        </div>
        <HoursWords day={day} />
      </RailPage>
      {editing ? (
        <Sheet title={editing === 'new' ? 'Time' : 'Correct'} onClose={close} width={620}>
          <EntryForm entry={editing === 'new' ? null : editing} day={day} onDone={close} />
        </Sheet>
      ) : null}
    </>
  );
}

function PeopleHours({
  entries,
  now,
  onEdit,
}: {
  entries: ClockEntryDto[];
  now: string;
  onEdit: (entry: ClockEntryDto) => void;
}) {
  const format = useFormats();
  const people = [...new Map(entries.map((entry) => [entry.personId, entry.personName]))].sort((a, b) =>
    a[1].localeCompare(b[1]),
  );
  return (
    <>
      {people.map(([personId, name]) => {
        const own = entries.filter((entry) => entry.personId === personId);
        const worked = own
          .filter((e) => e.kind !== 'meal_break' && !e.isForgotten)
          .reduce((sum, e) => sum + minutesBetween(e.startedAt, e.endedAt ?? now), 0);
        return (
          <section key={personId} className="mb-5" aria-label={name}>
            <h2 className="sec">
              {name} <span>{formatMinutes(worked)} on the clock</span>
            </h2>
            <div className="flex flex-wrap gap-1 mt-2">
              {own.map((entry) => (
                <button
                  key={entry.id}
                  type="button"
                  className="border border-line-strong rounded-[3px] bg-sheet-lift px-2 py-1 text-left hover:bg-lane min-h-[40px]"
                  onClick={() => onEdit(entry)}
                >
                  <b className="t-tight">{clockKindNames[entry.kind]}</b>
                  {entry.jobNumber ? <span className="t-2"> {entry.jobNumber}</span> : null}
                  <br />
                  {entry.endedAt ? (
                    format.span(entry.startedAt, entry.endedAt)
                  ) : entry.isForgotten ? (
                    <span className="text-clay-text font-bold">
                      <Mark name="m-late" /> since {formatDay(dayOf(entry.startedAt, format.zone))},{' '}
                      {format.clock(entry.startedAt)}, no clock-out
                    </span>
                  ) : (
                    `since ${format.clock(entry.startedAt)}`
                  )}
                </button>
              ))}
            </div>
          </section>
        );
      })}
    </>
  );
}
