import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { useFormats } from '../../../lib/format.ts';
import { isRunning } from './week-model.ts';

const order = ['draft', 'checked', 'locked'] as const;
const names = { draft: 'Draft', checked: 'Checked', locked: 'Locked' };

/** Three stops on the rail; the one bead stands at the stage that the week has reached. */
export function StageRail({ dto, toSettle, now }: { dto: PayWeekDto; toSettle: number; now: string }) {
  const format = useFormats();
  const { week, people } = dto;
  const at = (instant: string | null, by: string | null) =>
    instant ? `${formatDay(dayOf(instant, format.zone))}, ${format.clock(instant)}${by ? `, ${by}` : ''}` : null;
  const jobs = new Set(people.flatMap((person) => person.lines.flatMap((line) => line.jobId ?? []))).size;
  const words = {
    draft: isRunning(week, now)
      ? `The week runs to ${formatDay(week.endsOn)}`
      : people.length === 0
        ? 'Nothing was worked'
        : `From ${people.length === 1 ? 'one person’s clock' : `${people.length} people’s clocks`} and ${jobs === 1 ? '1 job' : `${jobs} jobs`}`,
    checked:
      at(week.checkedAt, week.checkedBy) ??
      (isRunning(week, now)
        ? 'Once the week is over'
        : toSettle > 0
          ? `After ${toSettle === 1 ? '1 thing is' : `${toSettle} things are`} settled`
          : 'Nothing is left to settle'),
    locked: at(week.lockedAt, week.lockedBy) ?? 'Lines freeze, statements go out',
  };
  const reached = order.indexOf(week.state);
  return (
    <ol className="stages" aria-label="Stage of the week">
      {order.map((stage, index) => (
        <li
          key={stage}
          className={index === reached ? 'is-here' : index > reached ? 'is-to' : ''}
          aria-current={index === reached ? 'step' : undefined}
        >
          {index === reached ? <i className="bead" /> : null}
          <b>{names[stage]}</b>
          <span>{words[stage]}</span>
        </li>
      ))}
    </ol>
  );
}
