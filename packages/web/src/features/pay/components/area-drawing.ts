import { exact } from '@driprail/shared/domain/money/exact';
import { centsText, decimalText, shortText, toCents } from '@driprail/shared/domain/money/rounding';
import type { PayLine, PayLineKind, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { rateText } from './ledger.ts';

/** A layer of the drawing: its area is money, spread over all hours of the week. */
export interface Layer {
  /** The number of the step in the working. */
  step: number;
  label: string;
  /** Dollars an hour, for drawing only. */
  rate: number;
}

export interface AreaDrawing {
  hours: number;
  hoursLabel: string;
  overtimeHours: number;
  layers: Layer[];
  /** Dollars an hour, for drawing only. */
  regularRate: number;
  premium: { step: number; label: string };
  description: string;
}

const OTHERS: [PayLineKind, string][] = [
  ['flat', 'flat amounts'],
  ['commission', 'commission'],
  ['bonus', 'bonuses'],
  ['minimum_wage_make_up', 'make-up'],
];

/**
 * The overtime premium as an area: hours are the width, the rate is the height. The layers stand in the order of the
 * working's steps, whose numbers they carry. Null where the figures are not those of one federal premium.
 */
export function areaDrawing(person: PersonWeek, line: PayLine): AreaDrawing | null {
  const isDrawn = line.kind === 'overtime_premium' && person.regularRate !== null && line.hours !== null;
  if (!isDrawn || person.regularRate === null || line.hours === null) return null;
  const hours = exact(person.hoursWorked);
  const over = exact(line.hours);
  const rate = exact(person.regularRate);
  if (hours.lte(0) || toCents(rate.mul(over).div(2)) !== line.amountCents) return null;
  const groups = layerGroups(person.lines);
  const layers = groups.map(({ words, cents }, index): Layer => {
    const each = exact(cents).div(100).div(hours);
    const said = words ?? `${shortText(hours)} h at ${rateText(groups[index]?.lines[0]?.rate ?? null)}`;
    const label = words
      ? `${said}, ${decimalText(each, 2)} on each hour, is ${centsText(cents)}`
      : `${said} is ${centsText(cents)}`;
    return { step: index + 2, label, rate: Number(decimalText(each, 4)) };
  });
  const last = line.working.filter((step) => step.result !== '').length;
  const premiumLabel = `half of ${decimalText(rate, 2)} on ${shortText(over)} h is ${centsText(line.amountCents)}`;
  return {
    hours: Number(decimalText(hours, 4)),
    hoursLabel: `${shortText(hours)} h`,
    overtimeHours: Number(decimalText(over, 4)),
    layers,
    regularRate: Number(decimalText(rate, 4)),
    premium: { step: last, label: premiumLabel },
    description: `Height is the rate, width is hours: ${[...layers.map((layer) => layer.label), premiumLabel].join('; ')}`,
  };
}

interface LayerGroup {
  /** Null for hours at one rate that covers the whole week. */
  words: string | null;
  cents: number;
  lines: PayLine[];
}

function layerGroups(lines: readonly PayLine[]): LayerGroup[] {
  const included = lines.filter((line) => line.inRegularRate);
  const hourly = included.filter((line) => line.kind === 'hourly');
  const groups: LayerGroup[] = hourly.map((line) => ({
    words: hourly.length === 1 ? null : `hours at ${rateText(line.rate)}`,
    cents: line.amountCents,
    lines: [line],
  }));
  for (const [kind, words] of OTHERS) {
    const own = included.filter((line) => line.kind === kind);
    if (own.length > 0) groups.push({ words, cents: own.reduce((sum, line) => sum + line.amountCents, 0), lines: own });
  }
  return groups;
}

/** What overtime on the hourly rate alone would have left out, in a sentence; null where nothing raises the rate. */
export function moreThanHourly(person: PersonWeek, line: PayLine): string | null {
  const hourly = person.lines.filter((own) => own.kind === 'hourly');
  const [only] = hourly;
  if (line.kind !== 'overtime_premium' || hourly.length !== 1 || !only?.rate || !line.hours) return null;
  const alone = toCents(exact(only.rate).mul(exact(line.hours)).div(2));
  const more = line.amountCents - alone;
  if (more <= 0) return null;
  const rate = rateText(only.rate);
  return `Not half of ${rate} alone: what else the week earned raises the rate, so overtime is ${centsText(more)} more.`;
}
