import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { addMinutes, isBefore } from '@driprail/shared/domain/time/zone';
import { useFormats } from '../../../lib/format.ts';
import { useSession } from '../../../lib/session.tsx';
import { lateMinutes } from './trouble-picks.ts';

/** What being late does to the next promise, and a text to the customer that the crew sends by its own hand. */
export function LatePart({
  visit,
  next,
  picked,
}: {
  visit: RunVisitDto;
  next: RunVisitDto | undefined;
  picked: readonly string[];
}) {
  const { company } = useSession();
  const format = useFormats();
  const minutes = lateMinutes(picked);
  if (minutes === null) return null;
  const words = `${company.name}: we are running about ${minutes} minutes late. Sorry, and thank you for waiting.`;
  return (
    <>
      {next?.from ? <p className="t-2 mb-2">{nextWords(next, next.from, minutes, format)}</p> : null}
      {visit.phone ? (
        <a className="btn mb-3" href={`sms:${visit.phone}?body=${encodeURIComponent(words)}`}>
          Text the customer, {minutes} min late
        </a>
      ) : null}
    </>
  );
}

function nextWords(
  next: RunVisitDto,
  from: string,
  minutes: number,
  { clock }: Pick<ReturnType<typeof useFormats>, 'clock'>,
): string {
  const then = addMinutes(from, minutes);
  const isKept = next.windowTo === null || !isBefore(next.windowTo, then);
  return `Then ${next.customerName} is at about ${clock(then)}, ${isKept ? 'still inside the promise' : 'after the promise'}.`;
}
