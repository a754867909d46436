import type { WalkRoundDto } from '@driprail/shared/contracts/walk-round.contract';
import { interiorNames, lookOutcomeNames, paintNames } from '@driprail/shared/domain/walk-round/condition';
import { photoSetNames } from '@driprail/shared/domain/walk-round/views';
import { useFormats } from '../../../lib/format.ts';
import { MarkList } from './mark-list.tsx';
import { Outline } from './outline.tsx';
import type { ShownCar } from './shown-walk.ts';
import { Strokes } from './signature.tsx';

/** A walk-round as it was put down: who, when, marks, condition, initials. */
export function WalkRecord({ car, startReason }: { car: ShownCar; startReason: string }) {
  const format = useFormats();
  const { walkRound } = car;
  if (!walkRound) {
    return (
      <p className="empty">
        {startReason
          ? `Work began without a walk-round: ${startReason.toLowerCase()}.`
          : `No walk-round yet. Asked for: ${photoSetNames[car.photoSet].toLowerCase()}.`}
      </p>
    );
  }
  return (
    <>
      <p>
        {walkRound.by}, {format.clock(walkRound.at)}
        {car.isWaiting ? ', waiting to send' : ''}
        {walkRound.isLate ? '. Arrived after work began.' : ''}
      </p>
      <Outline body={walkRound.body} marks={walkRound.marks} />
      <MarkList marks={walkRound.marks} />
      <dl className="wr-facts">
        {factsOf(walkRound).map(([name, words]) => (
          <div key={name}>
            <dt>{name}</dt>
            <dd>{words}</dd>
          </div>
        ))}
      </dl>
      {walkRound.initials ? <Strokes strokes={walkRound.initials} /> : null}
    </>
  );
}

function factsOf(round: WalkRoundDto): [name: string, words: string][] {
  const facts: [string, string | null][] = [
    ['Paint', round.paint && paintNames[round.paint]],
    ['Interior', round.interior && interiorNames[round.interior]],
    ['Odometer', round.odometer === null ? null : round.odometer.toLocaleString('en-US')],
    ['Personal items', round.hasItems ? round.itemsNote || 'Yes' : 'None seen'],
    ['May be moved', round.mayMove ? 'Yes' : 'No, it stays'],
    ['Views missing', round.missingReason || null],
    ['Too dirty to see', round.isTooDirty ? lookWords(round) : null],
    ['Customer', round.initials ? 'Signed' : `Not present: ${round.absentReason.toLowerCase()}`],
  ];
  return facts.flatMap(([name, words]) => (words ? [[name, words] as [string, string]] : []));
}

function lookWords({ secondLook }: WalkRoundDto): string {
  if (!secondLook) return 'Second look still to come';
  return [lookOutcomeNames[secondLook.outcome], secondLook.note].filter(Boolean).join('. ');
}
