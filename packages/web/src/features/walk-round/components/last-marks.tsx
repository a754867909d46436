import { v4 as uuid } from 'uuid';
import type { MarkBody, WalkMarkDto } from '@driprail/shared/contracts/walk-round.contract';
import { carry, markAnswerNames, markAnswers, markKindNames } from '@driprail/shared/domain/walk-round/marks';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Picks } from '../../../components/picks.tsx';
import { useFormats } from '../../../lib/format.ts';

/** Each mark of this car's last walk-round, to be answered: still there, worse, gone. */
export function LastMarks({
  last,
  lastAt,
  marks,
  onChange,
}: {
  last: readonly WalkMarkDto[];
  lastAt: string | null;
  marks: readonly MarkBody[];
  onChange: (marks: MarkBody[]) => void;
}) {
  const format = useFormats();
  if (last.length === 0) return null;
  return (
    <section aria-label="Marks of last time">
      <h2 className="sec">
        From last time <span>{lastAt ? formatDay(dayOf(lastAt, format.zone)) : ''}</span>
      </h2>
      {last.map((old) => {
        const own = marks.find((mark) => mark.carriedFrom === old.id);
        return (
          <div key={old.id} className="wr-ask" role="group" aria-label={`${markKindNames[old.kind]}, ${old.place}`}>
            <p>
              <b>{markKindNames[old.kind]}</b> {old.place}
              {old.note ? <span className="t-2">. {old.note}</span> : null}
            </p>
            <Picks
              options={markAnswers}
              value={own?.answer ?? null}
              nameOf={(answer) => markAnswerNames[answer]}
              onPick={(answer) =>
                onChange(
                  own
                    ? marks.map((mark) => (mark === own ? { ...mark, answer } : mark))
                    : [...marks, bareMark(carry(old, uuid(), answer))],
                )
              }
              className="grid grid-cols-3 gap-2"
            />
          </div>
        );
      })}
    </section>
  );
}

/** Without who put it down and when: that is this walk-round's own. */
function bareMark({ id, x, y, place, kind, size, note, carriedFrom, answer }: MarkBody): MarkBody {
  return { id, x, y, place, kind, size, note, carriedFrom, answer };
}
