import { exact, sum } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';
import type { WhatIfWeek } from '@driprail/shared/contracts/pay-plans.contract';
import { Empty } from '../../../components/states.tsx';
import { hoursMinutes, money } from '../../../lib/format.ts';

/** Each week as paid and as tried, the difference drawn from a middle line. */
export function WhatIfTable({ name, weeks }: { name: string; weeks: WhatIfWeek[] }) {
  if (weeks.length === 0) return <Empty>{name} has no pay in these weeks.</Empty>;
  const widest = Math.max(1, ...weeks.map((week) => Math.abs(week.whatIfCents - week.asPaidCents)));
  const total = (of: (week: WhatIfWeek) => number) => weeks.reduce((all, week) => all + of(week), 0);
  const [paid, tried] = [total((week) => week.asPaidCents), total((week) => week.whatIfCents)];
  return (
    <div className="wi-box">
      <table className="wt">
        <thead>
          <tr>
            <th scope="col">The hours and jobs of {name}</th>
            <th scope="col">Hours</th>
            <th scope="col">Sold</th>
            <th scope="col">As paid</th>
            <th scope="col">What if</th>
            <th scope="col" className="df">
              <i className="key is-less" aria-hidden /> less <i className="key is-more" aria-hidden /> more
            </th>
          </tr>
        </thead>
        <tbody>
          {weeks.map((week) => (
            <tr key={week.startsOn}>
              <th scope="row">Week {week.number}</th>
              <td>{hoursMinutes(week.hours)}</td>
              <td>{money(week.soldCents)}</td>
              <td>{money(week.asPaidCents)}</td>
              <td className="n">{money(week.whatIfCents)}</td>
              <td className="df">
                <Difference cents={week.whatIfCents - week.asPaidCents} widest={widest} />
              </td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <th scope="row">{weeks.length === 1 ? '1 week' : `${weeks.length} weeks`}</th>
            <td>{hoursMinutes(sum(weeks.map((week) => exact(week.hours))).toFraction())}</td>
            <td>{money(total((week) => week.soldCents))}</td>
            <td>{money(paid)}</td>
            <td>{money(tried)}</td>
            <td className="df">{sumWords(paid, tried)}</td>
          </tr>
        </tfoot>
      </table>
    </div>
  );
}

function Difference({ cents, widest }: { cents: number; widest: number }) {
  if (cents === 0) return <>the same</>;
  const style = { '--v': Math.abs(cents) / widest } as React.CSSProperties;
  return (
    <span className={cents < 0 ? 'dv is-less' : 'dv is-more'} style={style}>
      <i aria-hidden />
      <em>{signed(cents)}</em>
    </span>
  );
}

/** "−69.60, 1.0% less". */
export function sumWords(paidCents: number, triedCents: number): string {
  const cents = triedCents - paidCents;
  if (cents === 0) return 'the same';
  if (paidCents === 0) return signed(cents);
  const percent = decimalText(exact(Math.abs(cents)).mul(100).div(paidCents), 1);
  return `${signed(cents)}, ${percent}% ${cents < 0 ? 'less' : 'more'}`;
}

function signed(cents: number): string {
  return cents < 0 ? money(cents) : `+${money(cents)}`;
}
