import { useState } from 'react';
import type { DayWorkDto } from '@driprail/shared/contracts/job-work.contract';
import type { ChangeFacts } from '@driprail/shared/domain/job-work/judge-change';
import { usualSurcharges } from '@driprail/shared/domain/menu/condition-surcharge';
import { useSession } from '../../../lib/session.tsx';
import type { AtVisit } from '../api/work.queries.ts';
import { ChangeForm } from './change-form.tsx';
import { ChangeRow } from './change-row.tsx';
import type { WorkView } from './work-view.ts';

interface ChangePartProps {
  view: WorkView;
  at: AtVisit;
  day: Pick<DayWorkDto, 'offers'> & Partial<Pick<DayWorkDto, 'surcharges'>>;
  now: string;
}

/** Changes of the job at the car: those made, and a new one. */
export function ChangePart({ view, at, day, now }: ChangePartProps) {
  const { company } = useSession();
  const [isOpen, setOpen] = useState(false);
  const { work, startedAt, waitingChanges, progress } = view;
  const facts: ChangeFacts = {
    ...{ zone: company.zone, clock: company.clock, startedAt, plannedFrom: work.plannedFrom },
    ...{ crewSize: work.crewSize, crewSkills: work.crewSkills, lines: work.lines, offers: day.offers, next: work.next },
    // A copy that was kept before the owner could set them knows none.
    surcharges: day.surcharges ?? usualSurcharges,
  };
  const canChange = progress === 'on_site' || progress === 'working';
  return (
    <section aria-label="Change the job">
      {isOpen && canChange ? (
        <ChangeForm facts={facts} at={at} now={now} onDone={() => setOpen(false)} />
      ) : (
        <>
          <p className="wk-lead">
            {work.changes.length + waitingChanges.length === 0 ? (
              <>
                <b>As booked.</b> Nothing was changed at the car.
              </>
            ) : (
              <b>Changed at the car</b>
            )}
          </p>
          <ul className="wk-changes">
            {waitingChanges.map((words, index) => (
              <li key={index}>
                <b>{words}</b>
                <span className="t-2">waiting to send; the board is not asked yet</span>
              </li>
            ))}
            {work.changes.map((change) => (
              <ChangeRow key={change.id} change={change} />
            ))}
          </ul>
          <footer className="ph-act">
            {canChange ? (
              <button type="button" className="ph-main" onClick={() => setOpen(true)}>
                Change the job
              </button>
            ) : (
              <p className="t-2 py-2">A job is changed while the crew is at the car.</p>
            )}
          </footer>
        </>
      )}
    </section>
  );
}
