import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import type { DayWorkDto, VisitWorkDto } from '@driprail/shared/contracts/job-work.contract';
import { progressNames } from '@driprail/shared/domain/board/progress';
import { minutesBetween } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { PhonePageHead } from '../../../components/phone-page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { useNow } from '../../../lib/now.ts';
import { useOutbox } from '../../../lib/outbox/outbox.ts';
import { useSession } from '../../../lib/session.tsx';
import { useIsLive } from '../../../lib/socket.ts';
import { useOnline } from '../../../lib/use-online.ts';
import { NotYours, OutboxLine } from '../../run-sheet/index.ts';
import { dayWorkQuery } from '../api/work.queries.ts';
import { ChangePart } from '../components/change-part.tsx';
import { DonePart } from '../components/done-part.tsx';
import { KnowPart } from '../components/know-part.tsx';
import type { WorkPart } from '../components/part-before.ts';
import { StepsPart } from '../components/steps-part.tsx';
import { workView } from '../components/work-view.ts';
import './work.css';

const parts: { part: WorkPart; label: string }[] = [
  { part: 'know', label: 'Must-knows' },
  { part: 'steps', label: 'Steps' },
  { part: 'change', label: 'Change' },
  { part: 'done', label: 'Done' },
];

/** One job at the car: what to know first, the steps, a change of the job, and what Done needs. */
export function WorkPage() {
  const { day = '', visitId = '', part } = useParams();
  const { user } = useSession();
  const query = useQuery(dayWorkQuery(user.id, day));
  const isOnline = useOnline();
  return (
    <main className={isOnline ? 'ph wk' : 'ph wk is-adrift'} id="main">
      <Loaded query={query} what="the job">
        {(data) => {
          const work = data.works.find((one) => one.visitId === visitId);
          return work ? (
            <Work data={data} work={work} part={parts.find((one) => one.part === part)?.part ?? 'steps'} />
          ) : (
            <NotYours />
          );
        }}
      </Loaded>
    </main>
  );
}

function Work({ data, work, part }: { data: DayWorkDto; work: VisitWorkDto; part: WorkPart }) {
  const { user } = useSession();
  const { waiting } = useOutbox();
  const isOnline = useOnline();
  const isLive = useIsLive();
  const now = useNow();
  const view = workView(work, waiting, user.name);
  const since = view.startedAt ?? work.arrivedAt;
  const minutes = since ? Math.max(0, minutesBetween(since, now)) : null;
  const at = { visitId: work.visitId, customerName: work.customerName };
  return (
    <>
      <PhonePageHead
        back={paths.runSheetDay(data.day)}
        title={work.customerName}
        below={[...new Set(work.lines.map((line) => line.vehicle).filter(Boolean)), `job ${work.jobNumber}`].join(', ')}
      >
        {minutes === null ? null : (
          <p className="el">
            {Math.floor(minutes / 60)}:{String(minutes % 60).padStart(2, '0')}
            <small>{progressNames[view.progress].toLowerCase()}</small>
          </p>
        )}
      </PhonePageHead>
      <OutboxLine isOnline={isOnline} isLive={isLive} />
      <nav aria-label="Parts of this job">
        <ol className="steps wk-parts">
          <i className="rail-h" aria-hidden />
          {parts.map((one) => (
            <li key={one.part} className={one.part === part ? 'is-here' : ''}>
              {one.part === part ? <i className="bead" aria-hidden /> : null}
              <Link
                to={paths.work(data.day, work.visitId, one.part)}
                replace
                aria-current={one.part === part ? 'step' : undefined}
              >
                {one.label}
              </Link>
            </li>
          ))}
        </ol>
      </nav>
      {part === 'know' ? <KnowPart view={view} at={at} day={data.day} /> : null}
      {part === 'steps' ? <StepsPart view={view} at={at} day={data.day} now={now} /> : null}
      {part === 'change' ? <ChangePart view={view} at={at} day={data} now={now} /> : null}
      {part === 'done' ? <DonePart view={view} at={at} day={data.day} /> : null}
    </>
  );
}
