import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { Icon, Mark } from '../../../components/icon.tsx';
import { isPlacedVisit, lateOf, loadOf } from './board-model.ts';

/** The head of a lane: the van's name hangs, its crew and load lie below. Press it to change the crew. */
export function VanHead({
  board,
  vanId,
  now,
  onCrew,
}: {
  board: BoardDto;
  vanId: string;
  now: string;
  onCrew: (vanId: string) => void;
}) {
  const van = board.vans.find((v) => v.id === vanId);
  if (!van) return null;
  const { planned, there } = loadOf(board, vanId);
  const late = Math.max(
    0,
    ...board.visits.filter((v) => v.vanId === vanId && isPlacedVisit(v)).map((v) => lateOf(v, now)),
  );
  const off = van.crew.filter((person) => person.isOff);
  return (
    <div className="van-head">
      <h2 className="t-hang">{van.name}</h2>
      <button
        type="button"
        className="crew"
        onClick={() => onCrew(vanId)}
        aria-label={`Crew of ${van.name}: ${crewWords(van.crew)}. Change`}
      >
        {crewWords(van.crew)}
      </button>
      <p className="kit">
        {late > 0 ? (
          <span className="late">
            <Mark name="m-late" /> {formatMinutes(late)} late
          </span>
        ) : (
          <span>
            {there > 0 ? `${formatMinutes(planned)} of ${formatMinutes(there)}` : 'No shift'}
            {there === 0 && planned > 0 ? `, ${formatMinutes(planned)} planned` : ''}
          </span>
        )}
        {off.length > 0 ? (
          <span className="low">{off.map((person) => firstName(person.name)).join(', ')} off</span>
        ) : null}
        {van.equipment.includes('generator') ? <Icon name="power" title="Generator" /> : null}
        {van.equipment.includes('water_tank') ? <Icon name="drop" title="Water tank" /> : null}
      </p>
    </div>
  );
}

function crewWords(crew: BoardDto['vans'][number]['crew']): string {
  if (crew.length === 0) return 'No crew';
  return [
    ...new Set(
      crew.map((person) => (person.isTrainee ? `${firstName(person.name)} (trainee)` : firstName(person.name))),
    ),
  ].join(', ');
}

export function firstName(name: string): string {
  return name.split(' ')[0] ?? name;
}
