import type { ReactNode } from 'react';
import { useQuery } from '@tanstack/react-query';
import { getJob } from '@driprail/shared/contracts/jobs.contract';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { callBackCauseNames } from '@driprail/shared/domain/board/call-back';
import type { Move } from '@driprail/shared/domain/board/plan';
import { isEnded, isMovable, nextActions, progressNames } from '@driprail/shared/domain/board/progress';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { StatusMark } from '../../../components/status-mark.tsx';
import { Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { money, useFormats } from '../../../lib/format.ts';
import { mapLink } from '../../../lib/map-link.ts';
import { preview, vehiclesOf } from './board-model.ts';
import { MoveForm } from './move-form.tsx';
import { CrewCall } from './crew-call.tsx';
import { ProgressButtons } from './progress-buttons.tsx';
import { WalkSection } from './walk-section.tsx';

interface VisitSheetProps {
  board: BoardDto;
  visit: VisitDto;
  isBusy: boolean;
  /** What happens at the car. */
  work: ReactNode;
  onMove: (move: Move, words: string) => void;
  onClose: () => void;
  onStep: (by: 1 | -1) => void;
  onEdit: (jobId: string) => void;
  onCopy: (jobId: string) => void;
  onCallOff: (jobId: string) => void;
  onAddVisit: (jobId: string) => void;
  onBill: (jobId: string) => void;
  onCallBack: (jobId: string) => void;
}

/** The open ticket: its paper hangs over the board, which stays live beside it. */
export function VisitSheet({
  board,
  visit,
  isBusy,
  work,
  onMove,
  onClose,
  onStep,
  onEdit,
  onCopy,
  onCallOff,
  onAddVisit,
  onBill,
  onCallBack,
}: VisitSheetProps) {
  const format = useFormats();
  const job = useQuery({
    queryKey: ['jobs', visit.jobId],
    queryFn: ({ signal }) => call(getJob, { params: { id: visit.jobId } }, signal),
  });
  const standing =
    isMovable(visit.progress) && visit.vanId
      ? preview(board, { visitId: visit.id, vanId: visit.vanId, from: visit.from, to: visit.to }).warnings
      : [];
  return (
    <aside className="open" aria-label={`${visit.customerName}, job ${visit.jobNumber}`}>
      <header className="oh">
        <h2 className="t-hang">{visit.customerName}</h2>
        <p>
          <StatusMark status={visit.progress}>
            {progressNames[visit.progress]}, job {visit.jobNumber}
            {visit.parts > 1 ? `, visit ${visit.part} of ${visit.parts}` : ''}
          </StatusMark>
          <br />
          <span className="t-2">{vehiclesOf(visit)}</span>
        </p>
        <div className="x">
          <Button look="bare" aria-label="Earlier visit" onClick={() => onStep(-1)}>
            <Icon name="up" />
          </Button>
          <Button look="bare" aria-label="Later visit" onClick={() => onStep(1)}>
            <Icon name="dn" />
          </Button>
          <Button look="bare" aria-label="Close" onClick={onClose}>
            <Icon name="x" />
          </Button>
        </div>
      </header>
      <div className="open-in">
        <div>
          <section>
            <h3 className="sec">
              {visit.customerName} {visit.phone ? <a href={`tel:${visit.phone}`}>{visit.phone}</a> : null}
            </h3>
            <p>
              {visit.address}{' '}
              <a href={mapLink(visit)} target="_blank" rel="noreferrer">
                Map
              </a>
            </p>
            <ul className="acc">
              <li>
                <Icon name="gate" /> {visit.hasGateCode ? 'Gate code kept' : 'No gate code'}
              </li>
              <li>
                <Icon name={visit.hasWater ? 'hose' : 'nohose'} /> {visit.hasWater ? 'Spigot' : 'No spigot'}
              </li>
              <li>
                <Icon name="power" /> {visit.hasPower ? 'Outlet' : 'No outlet'}
              </li>
            </ul>
          </section>
          <section>
            <h3 className="sec">
              Work <span>{formatMinutes(visit.minutes)} planned</span>
            </h3>
            {visit.lines.map((line) => (
              <p className="ln" key={line.id}>
                <span>
                  {line.isFinished ? '✓ ' : ''}
                  {line.serviceName}
                  {line.vehicle ? <span className="t-3">, {line.vehicle}</span> : null}
                </span>
                <span className="m">{line.minutes}</span>
                <span>{money(line.priceCents)}</span>
              </p>
            ))}
            <Loaded query={job} what="the job">
              {({ job: data }) => (
                <>
                  {data.callBackOf && data.callBackCause ? (
                    <p className="tape my-2">
                      <b>Call-back of job {data.callBackOf.number}.</b> {callBackCauseNames[data.callBackCause]}. Free
                      to the customer.
                    </p>
                  ) : null}
                  {data.callBacks.map((one) => (
                    <p key={one.id} className="t-2">
                      Put right by job {one.number}: {callBackCauseNames[one.cause].toLowerCase()}
                    </p>
                  ))}
                  {data.discountCents > 0 ? (
                    <p className="ln">
                      <span>{data.discountReason}</span>
                      <span />
                      <span>{money(-data.discountCents)}</span>
                    </p>
                  ) : null}
                  <p className="ln sum">
                    <b>Job total, before tax</b>
                    <span />
                    <b>{money(data.totalCents)}</b>
                  </p>
                </>
              )}
            </Loaded>
          </section>
          <section>
            <h3 className="sec">Arrival window</h3>
            <p>
              {visit.windowFrom && visit.windowTo
                ? `Promised ${format.span(visit.windowFrom, visit.windowTo)}`
                : 'No window promised'}
            </p>
          </section>
          {visit.notes ? (
            <section>
              <h3 className="sec">Notes</h3>
              <p className="whitespace-pre-wrap">{visit.notes}</p>
            </section>
          ) : null}
        </div>
        <div>
          {standing.length > 0 ? (
            <section>
              <h3 className="sec">
                {standing.length} warning{standing.length === 1 ? '' : 's'}
              </h3>
              {standing.map((w) => {
                const accepted = visit.accepted.find((a) => a.key === w.key);
                return (
                  <div key={w.key} className="mt-2">
                    <p className={accepted ? 't-2' : 'tape'}>{w.message}</p>
                    {accepted ? (
                      <p className="t-3">
                        Kept: {accepted.reason}. {accepted.by}, {format.clock(accepted.at)}
                      </p>
                    ) : null}
                  </div>
                );
              })}
            </section>
          ) : null}
          {work}
          <WalkSection visit={visit} />
          <CrewCall visit={visit} />
          {isEnded(visit.progress) || nextActions(visit.progress).length === 0 || !visit.vanId ? null : (
            <ProgressButtons visit={visit} />
          )}
          <section>
            <h3 className="sec">So far</h3>
            <Loaded query={job} what="what happened">
              {({ job: data }) => (
                <ol className="so-far">
                  {data.history.map((event, index) => (
                    <li key={index}>
                      <span>{format.clock(event.at)}</span>
                      <span>
                        {event.text}
                        {event.by ? <span className="t-3">, {event.by}</span> : null}
                      </span>
                    </li>
                  ))}
                </ol>
              )}
            </Loaded>
          </section>
          <section className="flex flex-wrap gap-2">
            <Button onClick={() => onEdit(visit.jobId)}>
              <Icon name="pen" /> Edit job
            </Button>
            <Button onClick={() => onCopy(visit.jobId)}>
              <Icon name="copy" /> Copy
            </Button>
            <Button onClick={() => onBill(visit.jobId)}>
              <Icon name="pay" /> Bill
            </Button>
            <Button onClick={() => onAddVisit(visit.jobId)}>Add visit</Button>
            {visit.progress === 'done' || visit.progress === 'part_done' ? (
              <Button onClick={() => onCallBack(visit.jobId)}>
                <Icon name="undo" /> Call-back
              </Button>
            ) : null}
            {isEnded(visit.progress) ? null : <Button onClick={() => onCallOff(visit.jobId)}>Call off</Button>}
            {isMovable(visit.progress) && visit.vanId ? (
              <Button
                onClick={() =>
                  onMove(
                    { visitId: visit.id, vanId: null, from: null, to: null },
                    `${visit.customerName} is back on Unplaced.`,
                  )
                }
              >
                Unplace
              </Button>
            ) : null}
          </section>
        </div>
      </div>
      {isMovable(visit.progress) ? (
        <footer className="open-foot">
          <MoveForm
            key={`${visit.id}:${visit.planVersion}:${board.day}`}
            board={board}
            visit={visit}
            isBusy={isBusy}
            onMove={onMove}
          />
        </footer>
      ) : null}
    </aside>
  );
}
