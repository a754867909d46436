import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { confirmHours, listHoursWords } from '@driprail/shared/contracts/hours.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { Button } from '../../../components/button.tsx';
import { StatusMark } from '../../../components/status-mark.tsx';
import { call } from '../../../lib/call.ts';

/** What people say of the week's hours. Silence is shown and blocks nothing; the desk may confirm for somebody. */
export function HoursWords({ day }: { day: string }) {
  const client = useQueryClient();
  const week = useQuery({
    queryKey: ['clock', 'week', day],
    queryFn: ({ signal }) => call(listHoursWords, { params: { startsOn: day } }, signal),
  });
  const confirm = useMutation({
    mutationFn: (personId: string) => call(confirmHours, { params: { startsOn: day, personId }, body: { note: '' } }),
    onSettled: () => client.invalidateQueries({ queryKey: ['clock'] }),
  });
  if (!week.data || week.data.words.length === 0) return null;
  const said = week.data.words.filter((word) => word.isRight !== null).length;
  return (
    <section className="hung p-5 max-w-[1100px] mt-9" aria-label="The week’s hours">
      <h2 className="sec">
        {formatDay(week.data.startsOn)} to {formatDay(week.data.endsOn)}: are the hours right?
        <span>
          {said} of {week.data.words.length} said so
        </span>
      </h2>
      <ul className="list-none m-0 p-0 grid grid-cols-2 gap-x-10 max-[900px]:grid-cols-1">
        {week.data.words.map((word) => (
          <li key={word.personId} className="flex items-center justify-between gap-3 border-b border-line min-h-[40px]">
            <span>
              <b>{word.personName}</b>
              {word.note ? <span className="t-2"> {word.note}</span> : null}
            </span>
            {word.isRight === null ? (
              <Button look="bare" isBusy={confirm.isPending} onClick={() => confirm.mutate(word.personId)}>
                Nothing said. Confirm
              </Button>
            ) : (
              <StatusMark status={word.isRight ? 'done' : 'called_off'}>
                {word.isRight ? 'Right' : 'Not right'}
                {word.by && word.by !== word.personName ? `, by ${word.by}` : ''}
              </StatusMark>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
