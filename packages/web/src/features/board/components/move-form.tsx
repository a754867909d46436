import { useState } from 'react';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { Move } from '@driprail/shared/domain/board/plan';
import { formatClock } from '@driprail/shared/domain/time/format';
import { addMinutes, clockOf, overlaps } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { isPlacedVisit, preview } from './board-model.ts';
import { firstFit } from './first-fit.ts';

/** "Move to": van, day and time by form; says what the move does before it is pressed. */
export function MoveForm({
  board,
  visit,
  isBusy,
  onMove,
}: {
  board: BoardDto;
  visit: VisitDto;
  isBusy: boolean;
  onMove: (move: Move, words: string) => void;
}) {
  const [start] = useState(() => (isPlacedVisit(visit) ? visit : firstFit(board, visit, serverNow().toISOString())));
  const [vanId, setVanId] = useState(start.vanId ?? '');
  const [day, setDay] = useState(board.day);
  const [time, setTime] = useState(start.from ? clockOf(start.from, board.zone) : board.dayStartsAt);
  const [isBeside, setBeside] = useState(false);
  const isDay = /^\d{4}-\d{2}-\d{2}$/.test(day);
  const isTime = /^\d{2}:\d{2}$/.test(time);
  const from = isDay && isTime ? instantOf(day, time, board.zone) : null;
  const to = from ? addMinutes(from, visit.minutes) : null;
  const beside = board.visits.find(
    (v) =>
      from &&
      to &&
      v.vanId === vanId &&
      v.id !== visit.id &&
      v.from &&
      v.to &&
      overlaps({ from: v.from, to: v.to }, { from, to }),
  );
  const move: Move = { visitId: visit.id, vanId, from, to, ...(isBeside && beside && { stopId: beside.stopId }) };
  const found = from && day === board.day ? preview(board, move) : null;
  const refusal = found?.refusals[0];
  const vanName = board.vans.find((van) => van.id === vanId)?.name ?? '';
  return (
    <form
      className="move"
      onSubmit={(event) => {
        event.preventDefault();
        if (from && !isBusy)
          onMove(move, `${visit.customerName} is on ${vanName} at ${formatClock(from, board.zone, board.clock)}.`);
      }}
    >
      <b className="sec-like">{visit.vanId ? 'Move to' : 'Place on'}</b>
      <SelectField label="Van" value={vanId} onChange={(event) => setVanId(event.target.value)}>
        {board.vans.map((van) => (
          <option key={van.id} value={van.id}>
            {van.name}
            {van.crew.length > 0 ? `, ${van.crew.map((p) => p.name.split(' ')[0]).join(', ')}` : ''}
          </option>
        ))}
      </SelectField>
      <TextField label="Day" type="date" required value={day} onChange={(event) => setDay(event.target.value)} />
      <TextField
        label="Time"
        type="time"
        step={300}
        required
        value={time}
        onChange={(event) => setTime(event.target.value)}
      />
      <Button type="submit" look="main" isBusy={isBusy} disabled={!from || (refusal !== undefined && !beside)}>
        {visit.vanId ? 'Move' : 'Place'}
      </Button>
      <p className="says" aria-live="polite">
        {refusal ? (
          <b className="text-clay-text">{refusal.message}</b>
        ) : found && found.warnings.length > 0 ? (
          found.warnings.map((w) => w.message).join(' ')
        ) : found ? (
          <b className="text-sealant-text">Fits.</b>
        ) : day !== board.day ? (
          'That day is checked when you press.'
        ) : null}
      </p>
      {beside ? (
        <CheckField
          label={`Same parking place as ${beside.customerName}, side by side`}
          checked={isBeside}
          onChange={(event) => setBeside(event.target.checked)}
        />
      ) : null}
    </form>
  );
}
