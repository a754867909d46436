import { useState } from 'react';
import { Link } from 'react-router';
import type { PastJobDto } from '@driprail/shared/contracts/customers.contract';
import { progressNames } from '@driprail/shared/domain/board/progress';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { formatDate, formatMinutes } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Empty } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';

const FEW = 6;

/** Jobs, the newest first, each with a photo before and after where they were taken. */
export function RecordHistory({ history }: { history: PastJobDto[] }) {
  const [isWhole, setWhole] = useState(false);
  const shown = isWhole ? history : history.slice(0, FEW);
  return (
    <section>
      <h3 className="sec">
        <span className="cu-sec">
          Jobs <small>photos before (hatched) and after</small>
        </span>
        {history.length > FEW ? (
          <button type="button" className="link" aria-expanded={isWhole} onClick={() => setWhole(!isWhole)}>
            {isWhole ? 'The latest' : `All ${history.length}`}
          </button>
        ) : null}
      </h3>
      {history.length === 0 ? <Empty>No jobs yet.</Empty> : null}
      <ul className="cu-jobs">
        {shown.map((job) => (
          <PastJob key={job.jobId} job={job} />
        ))}
      </ul>
    </section>
  );
}

function PastJob({ job }: { job: PastJobDto }) {
  const format = useFormats();
  const day = job.on && dayOf(job.on, format.zone);
  const time = [
    job.workedMinutes === null ? '' : formatMinutes(job.workedMinutes),
    job.plannedMinutes > 0 ? `plan ${formatMinutes(job.plannedMinutes)}` : '',
  ]
    .filter(Boolean)
    .join(', ');
  return (
    <li>
      <p className="cu-when">
        {day ? formatDate(day) : 'No date'}
        <small>
          {day ? (
            <Link to={`${paths.boardDay(day)}?job=${job.jobId}`}>job {job.jobNumber}</Link>
          ) : (
            `job ${job.jobNumber}`
          )}
        </small>
      </p>
      <p className="cu-what">
        <b>{job.services}</b>
        <small>{[job.vehicles, job.vanName, job.crew].filter(Boolean).join(', ')}</small>
        {time ? <small>{time}</small> : null}
      </p>
      <Photos job={job} />
      <p className="cu-sum">
        {money(job.totalCents)}
        <small>{progressNames[job.progress as Progress]}</small>
      </p>
    </li>
  );
}

function Photos({ job: { photos, photoCount, photoVisitId } }: { job: PastJobDto }) {
  if (photoVisitId === null) return <p className="cu-photos t-3">No photos</p>;
  return (
    <Link className="cu-photos" to={paths.walkRecord(photoVisitId)} aria-label={`${photoCount} photos of this job`}>
      {photos.map(({ id, moment }) => (
        <i key={id} className={moment === 'before' ? 'is-before' : ''}>
          <img src={`/api/photos/${id}`} alt="" loading="lazy" />
        </i>
      ))}
      <small>{photoCount} in all</small>
    </Link>
  );
}
