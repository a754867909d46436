import { Link } from 'react-router';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { progressNames } from '@driprail/shared/domain/board/progress';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { minutesBetween } from '@driprail/shared/domain/time/zone';
import { Icon } from '../../../components/icon.tsx';
import { StatusMark } from '../../../components/status-mark.tsx';
import { useFormats } from '../../../lib/format.ts';
import { mapLink } from '../../../lib/map-link.ts';
import { WalkLine } from './walk-line.tsx';

/** The visit at hand, large: where, what, how to get in, whom to call. */
export function NextCard({
  visit,
  now,
  workPath,
  collectPath,
  onTrouble,
  onTip,
}: {
  visit: RunVisitDto;
  now: string;
  /** The job's own page: must-knows, steps, a change. */
  workPath: string;
  /** The bill, and how it is paid. */
  collectPath: string;
  onTrouble: () => void;
  onTip: () => void;
}) {
  const format = useFormats();
  const isOpen = visit.phone !== null;
  return (
    <article className="next-card" aria-label={visit.customerName}>
      <div className="flex justify-between gap-3">
        <span>{visit.from && visit.to ? format.span(visit.from, visit.to) : ''}</span>
        <StatusMark status={visit.progress}>
          {progressNames[visit.progress]}
          {visit.since && visit.progress !== 'placed'
            ? ` ${formatMinutes(Math.max(0, minutesBetween(visit.since, now)))}`
            : ''}
        </StatusMark>
      </div>
      <h2 className="t-hang" style={{ fontSize: nameSize(visit.customerName) }}>
        {visit.customerName}
      </h2>
      <p className="addr">
        {visit.address}
        {visit.area ? <span className="t-2">, {visit.area}</span> : null}
      </p>
      {visit.windowFrom && visit.windowTo ? (
        <p className="t-2">Promised {format.span(visit.windowFrom, visit.windowTo)}</p>
      ) : null}
      <ul className="work">
        {visit.lines.map((line) => (
          <li key={line.id}>
            <b>{line.serviceName}</b>
            <span className="t-2">
              {line.vehicle}
              {line.isFinished ? ', finished' : ''}
            </span>
          </li>
        ))}
      </ul>
      <ul className="access">
        <li>
          <Icon name="gate" />
          {isOpen ? (
            visit.gateCode ? (
              <span>
                Gate <b>{visit.gateCode}</b>
              </span>
            ) : (
              'No gate code'
            )
          ) : visit.hasGateCode ? (
            'Gate code comes on the day'
          ) : (
            'No gate code'
          )}
        </li>
        <li>
          <Icon name={visit.hasWater ? 'hose' : 'nohose'} /> {visit.hasWater ? 'Spigot' : 'No spigot, own water'}
        </li>
        <li>
          <Icon name="power" /> {visit.hasPower ? 'Outlet' : 'No outlet'}
        </li>
        {visit.accessNotes ? (
          <li className="wide">
            <Icon name="key" /> {visit.accessNotes}
          </li>
        ) : null}
      </ul>
      {visit.isCallBack ? (
        <p className="tape my-2">
          <b>Call-back.</b> Something is put right; it costs the customer nothing.
        </p>
      ) : null}
      {visit.notes ? <p className="notes">{visit.notes}</p> : null}
      <WalkLine visit={visit} />
      <div className="card-acts">
        <Link className="btn" to={workPath}>
          <Icon name="check" /> Job
        </Link>
        <a className="btn" href={mapLink(visit)} target="_blank" rel="noreferrer">
          <Icon name="route" /> Map
        </a>
        {visit.phone ? (
          <a className="btn" href={`tel:${visit.phone}`}>
            <Icon name="phone" /> Call
          </a>
        ) : (
          <span className="btn" aria-disabled="true">
            <span>No number yet</span>
          </span>
        )}
        <button type="button" className="btn" onClick={onTrouble}>
          <Icon name="note" /> Trouble
        </button>
        {visit.progress === 'on_site' || visit.progress === 'working' || visit.progress === 'done' ? (
          <>
            <button type="button" className="btn" onClick={onTip}>
              <Icon name="tip" /> Tip
            </button>
            <Link className="btn" to={collectPath}>
              <Icon name="pay" /> Get paid
            </Link>
          </>
        ) : null}
      </div>
    </article>
  );
}

/** The longest word of a name stays on one line at 360 px. */
function nameSize(name: string): number {
  const longest = Math.max(1, ...name.split(/[\s-]/).map((word) => word.length));
  return Math.min(54, Math.floor(470 / longest));
}
