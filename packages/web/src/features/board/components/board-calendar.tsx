import { memo, useEffect, useMemo, useRef } from 'react';
import type { AllowFunc, EventContentArg, EventDropArg, EventMountArg, SlotLabelContentArg } from '@fullcalendar/core';
import interactionPlugin from '@fullcalendar/interaction';
import type { EventDragStopArg, EventReceiveArg, EventResizeDoneArg } from '@fullcalendar/interaction';
import luxonPlugin from '@fullcalendar/luxon3';
import FullCalendar from '@fullcalendar/react';
import resourceTimeGridPlugin from '@fullcalendar/resource-timegrid';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { Move } from '@driprail/shared/domain/board/plan';
import { formatClock, formatSpan } from '@driprail/shared/domain/time/format';
import { addMinutes, clockOf, minutesBetween } from '@driprail/shared/domain/time/zone';
import { useFormats } from '../../../lib/format.ts';
import { useSession } from '../../../lib/session.tsx';
import type { Gap, PlacedVisit } from './board-model.ts';
import { isPlacedVisit } from './board-model.ts';
import type { Held } from './calendar-events.ts';
import { calendarEvents } from './calendar-events.ts';
import { Ticket, ticketLabel } from './ticket.tsx';
import { VanHead } from './van-head.tsx';

const plugins = [resourceTimeGridPlugin, interactionPlugin, luxonPlugin];

export interface BoardCalendarProps {
  board: BoardDto;
  now: string;
  filter: string;
  openId: string | null;
  held: Held | null;
  onOpen: (visitId: string) => void;
  onCrew: (vanId: string) => void;
  /** Where a held ticket would land; null when it left the lanes. */
  onHover: (move: Move | null) => void;
  onMove: (move: Move) => void;
}

/**
 * The lanes: the library keeps time, hits and drags; every look is ours. It is drawn anew only for what it
 * shows: each drawing makes the library start afresh, also while a ticket is held.
 */
export const BoardCalendar = memo(function BoardCalendar({
  board,
  now,
  filter,
  openId,
  held,
  onOpen,
  onCrew,
  onHover,
  onMove,
}: BoardCalendarProps) {
  const calendar = useRef<FullCalendar>(null);
  const format = useFormats();
  const style = useSession().company.clock;
  const events = useMemo(() => calendarEvents(board, now, filter, openId, held), [board, now, filter, openId, held]);
  const resources = useMemo(
    () => board.vans.map((van, order) => ({ id: van.id, title: van.name, order })),
    [board.vans],
  );
  const span = useMemo(() => slotSpan(board), [board]);
  const visits = useMemo(
    () => new Map(board.visits.filter(isPlacedVisit).map((visit) => [visit.id, visit])),
    [board.visits],
  );
  const unplaced = useMemo(() => new Map(board.unplaced.map((visit) => [visit.id, visit])), [board.unplaced]);
  const troubled = useMemo(() => new Set(board.troubles.map((trouble) => trouble.visitId)), [board.troubles]);

  // A mounted ticket keeps its element: what readers hear of it follows the visit.
  useEffect(() => {
    const span = (visit: PlacedVisit) => formatSpan(visit.from, visit.to, board.zone, board.clock);
    for (const visit of visits.values()) {
      const vanName = board.vans.find((van) => van.id === visit.vanId)?.name ?? '';
      document
        .querySelector(`[data-event-id="${visit.id}"]:not(.fc-event-mirror)`)
        ?.setAttribute('aria-label', ticketLabel(visit, vanName, span(visit)));
    }
  }, [board.vans, board.zone, board.clock, visits]);

  useEffect(() => {
    calendar.current?.getApi().gotoDate(board.day);
  }, [board.day]);

  /** A moved visit keeps its real length: the library counts by the clock, which jumps twice a year. */
  const moved = (visitId: string, vanId: string | null, startStr: string): Move => {
    const placed = visits.get(visitId);
    const minutes = placed ? minutesBetween(placed.from, placed.to) : (unplaced.get(visitId)?.minutes ?? 60);
    return { visitId, vanId, from: utc(startStr), to: addMinutes(utc(startStr), minutes) };
  };
  const allow: AllowFunc = (span_, event) => {
    const vanId = (span_ as { resource?: { id: string } }).resource?.id ?? null;
    const visitId = event?.id || (event?.extendedProps['visitId'] as string | undefined);
    if (!visitId) return true;
    const move = moved(visitId, vanId, span_.startStr);
    // One edge stands still while the other is pulled.
    const isPulled = visits.get(visitId)?.from === move.from;
    queueMicrotask(() => onHover(isPulled ? { ...move, to: utc(span_.endStr) } : move));
    return true;
  };
  const drop = (arg: EventDropArg) => {
    const vanId = arg.newResource?.id ?? arg.event.getResources()[0]?.id ?? null;
    const move = moved(arg.event.id, vanId, arg.event.startStr);
    // The library's own copy goes back; the cache moves the ticket.
    arg.revert();
    onMove(move);
  };
  const resize = (arg: EventResizeDoneArg) => {
    const move = {
      visitId: arg.event.id,
      vanId: arg.event.getResources()[0]?.id ?? null,
      from: utc(arg.event.startStr),
      to: utc(arg.event.endStr),
    };
    arg.revert();
    onMove(move);
  };
  const receive = (arg: EventReceiveArg) => {
    // A ticket of its own comes back this way too, when the calendar was drawn anew while it was held.
    const visitId = arg.event.id || (arg.event.extendedProps['visitId'] as string);
    const move = moved(visitId, arg.event.getResources()[0]?.id ?? null, arg.event.startStr);
    arg.event.remove();
    onMove(move);
  };
  const dragStop = ({ event, jsEvent }: EventDragStopArg) => {
    onHover(null);
    const under = document.elementFromPoint(jsEvent.clientX, jsEvent.clientY);
    if (under?.closest('[data-roof]')) onMove({ visitId: event.id, vanId: null, from: null, to: null });
  };

  return (
    <FullCalendar
      ref={calendar}
      plugins={plugins}
      schedulerLicenseKey="GPL-My-Project-Is-Open-Source"
      initialView="resourceTimeGridDay"
      initialDate={board.day}
      timeZone={board.zone}
      now={now}
      nowIndicator
      headerToolbar={false}
      allDaySlot={false}
      height="100%"
      expandRows
      slotMinTime={span.from}
      slotMaxTime={span.to}
      slotDuration="00:05:00"
      snapDuration="00:05:00"
      slotLabelInterval="01:00"
      slotEventOverlap={false}
      editable
      droppable
      eventResourceEditable
      eventDurationEditable
      dragRevertDuration={0}
      eventDragMinDistance={5}
      longPressDelay={300}
      resources={resources}
      resourceOrder="order"
      events={events}
      eventInteractive
      eventAllow={allow}
      eventDrop={drop}
      eventResize={resize}
      eventReceive={receive}
      eventDragStop={dragStop}
      eventClick={({ event }) => {
        if (event.extendedProps['kind'] === 'visit') onOpen(event.id);
      }}
      slotLabelContent={(arg: SlotLabelContentArg) => <span>{hourLabel(arg.date, board.zone, style)}</span>}
      nowIndicatorContent={({ isAxis }) => (isAxis ? <NowLabel label={formatClock(now, board.zone, style)} /> : null)}
      resourceLabelContent={({ resource }) => <VanHead board={board} vanId={resource.id} now={now} onCrew={onCrew} />}
      eventContent={(arg: EventContentArg) => {
        const kind = arg.event.extendedProps['kind'] as string | undefined;
        if (kind === 'gap') return <GapWords gap={arg.event.extendedProps['gap'] as Gap} distance={format.distance} />;
        if (kind === 'shut')
          return arg.event.extendedProps['words'] ? (
            <span className="shut-l">{arg.event.extendedProps['words'] as string}</span>
          ) : null;
        if (kind === 'over') return null;
        const visit = ticketOf(arg, visits, unplaced);
        return visit ? <Ticket visit={visit} now={now} hasTrouble={troubled.has(visit.id)} /> : null;
      }}
      eventDidMount={({ event, el }: EventMountArg) => {
        const visit = visits.get(event.id);
        el.dataset['eventId'] = event.id;
        if (!visit) return;
        const vanName = board.vans.find((van) => van.id === visit.vanId)?.name ?? '';
        el.setAttribute('role', 'button');
        el.setAttribute('aria-label', ticketLabel(visit, vanName, format.span(visit.from, visit.to)));
      }}
    />
  );
});

/** What is drawn while a ticket is held stands at the held place, not at the stored one. */
function ticketOf(
  { event }: EventContentArg,
  visits: Map<string, PlacedVisit>,
  unplaced: Map<string, { id: string }>,
): PlacedVisit | null {
  const id = event.id || (event.extendedProps['visitId'] as string | undefined) || '';
  const visit = visits.get(id) ?? unplaced.get(id);
  if (!visit) return null;
  const vanId = event.getResources()[0]?.id ?? '';
  return { ...(visit as PlacedVisit), vanId, from: utc(event.startStr), to: utc(event.endStr || event.startStr) };
}

function GapWords({ gap, distance }: { gap: Gap; distance: (kilometers: number) => string }) {
  const { travel, there, isShort } = gap;
  const way = travel.kilometers === null ? '' : `, ${distance(travel.kilometers)}`;
  return (
    <span>
      {isShort
        ? `${travel.minutes} min needed, ${there} there`
        : travel.minutes === 0
          ? 'Next door'
          : `${travel.minutes} min${way}`}
    </span>
  );
}

function NowLabel({ label }: { label: string }) {
  return (
    <>
      <span className="now-l">{label}</span>
      <i className="bead" />
    </>
  );
}

function hourLabel(date: Date, zone: string, style: '12' | '24'): string {
  return formatClock(date.toISOString(), zone, style).replace(':00', style === '12' ? '' : ':00');
}

/** The hours of the day, stretched to whole hours around what hangs outside them. */
function slotSpan(board: BoardDto): { from: string; to: string } {
  const starts = board.visits.flatMap((visit) => (visit.from ? [clockOf(visit.from, board.zone)] : []));
  const ends = board.visits.flatMap((visit) => (visit.to ? [clockOf(visit.to, board.zone)] : []));
  const first = [board.dayStartsAt, ...starts].sort()[0] ?? '07:00';
  const last = [board.dayEndsAt, ...ends].sort().at(-1) ?? '18:00';
  const hour = Number(last.slice(0, 2)) + (last.endsWith(':00') ? 0 : 1);
  return { from: `${first.slice(0, 2)}:00:00`, to: `${String(Math.min(24, hour)).padStart(2, '0')}:00:00` };
}

function utc(withOffset: string): string {
  return new Date(withOffset).toISOString();
}
