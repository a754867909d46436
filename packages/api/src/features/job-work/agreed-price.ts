import type { ChangedLine, Judged } from '@driprail/shared/domain/job-work/judge-change';
import { centsText } from '@driprail/shared/domain/money/rounding';

/**
 * The customer said yes to what the phone showed. Where the menu says otherwise by now, the agreed price stands in the row
 * and the board is asked.
 * @param shownCents the difference that the customer saw
 */
export function agreedPrice(judged: Judged, shownCents: number): Judged {
  const off = shownCents - judged.priceDifferenceCents;
  if (off === 0) return judged;
  const changed = judged.after.find((line) => isChanged(line, judged));
  const after = judged.after.map((line) =>
    line === changed ? { ...line, priceCents: Math.max(0, line.priceCents + off) } : line,
  );
  const message = `The customer saw ${centsText(shownCents)}; the menu says ${centsText(judged.priceDifferenceCents)}.`;
  return {
    ...{ ...judged, after, priceDifferenceCents: shownCents },
    hindrances: [...judged.hindrances, { code: 'price_differs', message }],
  };
}

function isChanged(line: ChangedLine, { before }: Judged): boolean {
  const was = before.find((one) => one.id === line.id);
  return !was || was.priceCents !== line.priceCents || was.serviceId !== line.serviceId;
}
