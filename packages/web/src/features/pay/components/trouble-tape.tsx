import { Link } from 'react-router';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import type { PayWarning } from '@driprail/shared/domain/pay/pay-week.types';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { useFormats } from '../../../lib/format.ts';
import { FoldedTape } from './folded-tape.tsx';
import { boardJob, hoursOf } from './working.ts';

/** What must be settled, each with its way out. */
export function TroubleTape({ dto, warnings }: { dto: PayWeekDto; warnings: PayWarning[] }) {
  const items = warnings.map((warning) => ({
    key: `${warning.personId}:${warning.code}:${warning.entryId ?? warning.jobId ?? warning.message}`,
    children: (
      <>
        <Message dto={dto} warning={warning} /> <WayOut dto={dto} warning={warning} />
      </>
    ),
  }));
  return <FoldedTape items={items} />;
}

function Message({ dto, warning }: { dto: PayWeekDto; warning: PayWarning }) {
  const name = dto.people.find((person) => person.personId === warning.personId)?.name ?? '';
  const [before = '', ...after] = name === '' ? [warning.message] : warning.message.split(name);
  if (after.length === 0) return <span>{warning.message}</span>;
  return (
    <span>
      {before}
      <b>{name}</b>
      {after.join(name)}
    </span>
  );
}

function WayOut({ dto, warning }: { dto: PayWeekDto; warning: PayWarning }) {
  const { zone } = useFormats();
  const { code, entryId, jobId, personId } = warning;
  const time = dto.warningTimes[entryId ?? jobId ?? ''];
  const day = time ? dayOf(time, zone) : dto.week.startsOn;
  const working = paths.payWorking(dto.week.startsOn, personId);
  switch (code) {
    case 'open_entry':
    case 'overlapping_entries':
      return <Link to={hoursOf(day, entryId ?? undefined)}>Set the time</Link>;
    case 'short_meal_break':
      return <Link to={hoursOf(day, entryId ?? undefined)}>Open the entry</Link>;
    case 'done_without_clock':
      return (
        <>
          <Link to={hoursOf(day)}>Add the time</Link> or <Link to={boardJob(jobId ?? '', day)}>open the job</Link>
        </>
      );
    case 'no_hourly_rate':
      return <Link to={`${paths.rates}?person=${personId}`}>Set a rate</Link>;
    case 'under_minimum_wage':
      return <Link to={`${working}?line=minimum_wage_make_up`}>See the make-up</Link>;
    case 'deduction_refused':
      return <Link to={`?person=${personId}`}>Open the lines</Link>;
  }
}
