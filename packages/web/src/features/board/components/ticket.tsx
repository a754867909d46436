import { formatMinutes } from '@driprail/shared/domain/time/format';
import { progressNames } from '@driprail/shared/domain/board/progress';
import { minutesBetween } from '@driprail/shared/domain/time/zone';
import { Icon } from '../../../components/icon.tsx';
import { StatusMark } from '../../../components/status-mark.tsx';
import { useFormats } from '../../../lib/format.ts';
import type { PlacedVisit } from './board-model.ts';
import { lateOf, servicesOf, vehiclesOf } from './board-model.ts';

/** A visit on a lane: time and mark, name and vehicle, what and where, and what the crew must know. */
export function Ticket({ visit, now, hasTrouble }: { visit: PlacedVisit; now: string; hasTrouble: boolean }) {
  const format = useFormats();
  const late = lateOf(visit, now);
  return (
    <>
      <div className="l">
        <span className="tm">{format.bareSpan(visit.from, visit.to)}</span>
        <StatusMark status={visit.progress} isLate={late > 0}>
          {statusWords(visit, now, late, format.clock)}
        </StatusMark>
      </div>
      <p className="nm">
        <b>{visit.customerName}</b>
        <i>{vehiclesOf(visit)}</i>
      </p>
      <p className="sv">
        {visit.isCallBack ? 'Call-back: ' : ''}
        {servicesOf(visit)}
        {visit.area ? `, ${visit.area}` : ''}
        {visit.parts > 1 ? `. Visit ${visit.part} of ${visit.parts}` : ''}
      </p>
      {hasTrouble ? <p className="ex">Trouble reported</p> : null}
      <span className={minutesBetween(visit.from, visit.to) < 80 ? 'fl is-short' : 'fl'}>
        {visit.hasGateCode ? <Icon name="gate" title="Gate code" /> : null}
        {visit.hasWater ? null : <Icon name="nohose" title="No spigot: own water" />}
      </span>
    </>
  );
}

function statusWords(visit: PlacedVisit, now: string, late: number, clock: (instant: string) => string): string {
  if (late > 0)
    return visit.progress === 'working' || visit.progress === 'on_site'
      ? `${late} min over`
      : `Late ${formatMinutes(late)}`;
  const { progress, since } = visit;
  if (!since || progress === 'placed') return progressNames[progress];
  if (progress === 'done' || progress === 'part_done') return `${progressNames[progress]} ${clock(since)}`;
  if (progress === 'working' || progress === 'on_site')
    return `${progressNames[progress]} ${formatMinutes(Math.max(0, minutesBetween(since, now)))}`;
  return progressNames[progress];
}

/** All of a ticket in one sentence, for readers. */
export function ticketLabel(visit: PlacedVisit, vanName: string, span: string): string {
  const notes = [visit.hasGateCode ? 'gate code' : '', visit.hasWater ? '' : 'no spigot'].filter(Boolean).join(', ');
  return `${visit.customerName}, ${vanName}, ${span}, ${progressNames[visit.progress]}, ${visit.isCallBack ? 'call-back, ' : ''}${servicesOf(visit)}${notes ? `, ${notes}` : ''}`;
}
