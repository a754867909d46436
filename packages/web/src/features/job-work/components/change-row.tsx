import type { JobChangeDto } from '@driprail/shared/contracts/job-work.contract';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { money, useFormats } from '../../../lib/format.ts';

/** One change of a job: what, what it costs, and where it stands. */
export function ChangeRow({ change }: { change: JobChangeDto }) {
  const format = useFormats();
  return (
    <li>
      <b>{change.words}</b>
      <span>
        {signed(change.priceDifferenceCents)}, {timeWords(change.minutesDifference)}
      </span>
      <span className="t-2">
        {stateWords(change)} {format.clock(change.answeredAt ?? change.at)}
        {change.answer ? `: ${change.answer}` : ''}
      </span>
      <span className="t-2">
        {change.saidYesBy ? `${change.saidYesBy} said yes` : 'Customer said yes in person'}, {change.by}.{' '}
        {change.reason}
      </span>
    </li>
  );
}

/** "+55.00", with a true minus; "no difference" for none. */
export function signed(cents: number): string {
  if (cents === 0) return 'same price';
  return cents > 0 ? `+${money(cents)}` : money(cents);
}

export function timeWords(minutes: number): string {
  if (minutes === 0) return 'same time';
  return minutes > 0 ? `${formatMinutes(minutes)} more` : `${formatMinutes(-minutes)} less`;
}

function stateWords({ state, answeredBy, isBoardNotAsked }: JobChangeDto): string {
  if (state === 'asked') return isBoardNotAsked ? 'Board not asked, waits for an answer since' : 'Asked of the board';
  if (state === 'accepted') return `Accepted by ${answeredBy ?? 'the board'},`;
  if (state === 'declined') return `Declined by ${answeredBy ?? 'the board'}, kept as a quote,`;
  return state === 'quote' ? 'Kept as a quote,' : 'Done at once,';
}
