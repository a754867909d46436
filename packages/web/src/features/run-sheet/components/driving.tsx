import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import { addMinutes, minutesBetween } from '@driprail/shared/domain/time/zone';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { Icon } from '../../../components/icon.tsx';
import { useFormats } from '../../../lib/format.ts';
import { mapLink } from '../../../lib/map-link.ts';

/** On the way the phone is quiet: where to, the map, Arrived below. What changes waits until then. */
export function Driving({
  visit,
  from,
  onOpenSheet,
}: {
  visit: RunVisitDto;
  from: RunVisitDto | undefined;
  onOpenSheet: () => void;
}) {
  const format = useFormats();
  const arrives = arrivalOf(visit, from);
  return (
    <section className="driving" aria-label={`On the way to ${visit.customerName}`}>
      {arrives ? (
        <>
          <p>You arrive about</p>
          <p className="eta">{format.clock(arrives)}</p>
          <p className="t-2">{promiseWords(visit, arrives, format.span)}</p>
        </>
      ) : null}
      <h2 className="t-hang">{visit.customerName}</h2>
      <p className="addr">
        {visit.address}
        {visit.area ? <span className="t-2">, {visit.area}</span> : null}
      </p>
      <a className="btn" href={mapLink(visit)} target="_blank" rel="noreferrer">
        <Icon name="route" /> Open map
      </a>
      <p className="t-2">Hands on the wheel. Changes wait until Arrived.</p>
      <button type="button" className="link" onClick={onOpenSheet}>
        Riding along? Open the run sheet
      </button>
    </section>
  );
}

/** An estimate from setting off; nothing where it is not known from where. */
export function arrivalOf(visit: RunVisitDto, from: RunVisitDto | undefined): string | null {
  const { setOffAt } = visit.times;
  if (!setOffAt || !from) return null;
  const point = ({ lat, lng }: RunVisitDto) => (lat === null || lng === null ? null : { lat, lng });
  return addMinutes(setOffAt, estimateTravel(point(from), point(visit)).minutes);
}

function promiseWords(
  { windowFrom, windowTo }: RunVisitDto,
  arrives: string,
  span: (from: string, to: string) => string,
): string {
  if (!windowFrom || !windowTo) return 'An estimate.';
  const left = minutesBetween(arrives, windowTo);
  const words = left >= 0 ? `inside it by ${formatMinutes(left)}` : `${formatMinutes(-left)} after it`;
  return `An estimate. Promised ${span(windowFrom, windowTo)}, ${words}`;
}
