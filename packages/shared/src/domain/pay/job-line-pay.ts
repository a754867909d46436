import { dollars, exact } from '../money/exact.ts';
import { centsText, shortText, toCents } from '../money/rounding.ts';
import { formatDate } from '../time/format.ts';
import { dayOf } from '../time/zone.ts';
import { isShared, shareEarning, shareWords, type PersonShare } from './crew-shares.ts';
import { rateInForce } from './dated-rates.ts';
import { aLine } from './pay-line.ts';
import type {
  CrewSplit,
  DatedRate,
  DoneLine,
  PayLine,
  PayLineKind,
  PayPerson,
  SourceRef,
  WorkingStep,
} from './pay-week.types.ts';
import { rateSource, rateText } from './working-words.ts';

/** What a finished line is paid: dollars a line, or a percentage of what it sold for. */
export interface LinePrice {
  kind: 'flat' | 'commission';
  /** Decimal dollars or percent. */
  value: string;
  startsOn: string;
  source: SourceRef;
}

/** Whose share of what: the person, the line, how crews share and the company's zone. */
export interface LineShare {
  person: PayPerson;
  line: DoneLine;
  split: CrewSplit;
  zone: string;
}

/**
 * Flat and commission pay of one person for a finished job line by the dated rates. Each applies where a rate had
 * started; a percentage of 0 means none.
 */
export function jobLinePay(share: LineShare, rates: readonly DatedRate[]): PayLine[] {
  const { person, line, zone } = share;
  const kinds = line.commissionWaits ? (['flat_service'] as const) : (['flat_service', 'commission_percent'] as const);
  return kinds.flatMap((kind) => {
    const rate = rateInForce(rates, {
      kind,
      personId: person.id,
      serviceId: line.serviceId,
      clockKind: null,
      date: dayOf(line.doneAt, zone),
    });
    if (rate === null) return [];
    const { value, startsOn } = rate;
    return linePay(share, {
      kind: kind === 'flat_service' ? 'flat' : 'commission',
      value,
      startsOn,
      source: rateSource(rate),
    });
  });
}

/** One person's part of a finished line's price. The whole is rounded half up, then shared in the crew. */
export function linePay(share: LineShare, price: LinePrice): PayLine[] {
  const { person, line, split, zone } = share;
  if (exact(price.value).lte(0)) return [];
  const isFlat = price.kind === 'flat';
  const value = exact(price.value);
  const wholeCents = toCents(isFlat ? value : dollars(commissionBase(line)).mul(value).div(100));
  const shares = shareEarning(wholeCents, line.crew, split);
  const amountCents = centsOf(shares, person);
  if (amountCents === 0) return [];
  return [
    aLine({
      key: `${price.kind}:${line.lineId}`,
      personId: person.id,
      kind: price.kind,
      label: line.serviceName,
      workedOn: dayOf(line.doneAt, zone),
      rate: price.value,
      amountCents,
      inRegularRate: true,
      ...jobOf(line),
      rule: isFlat
        ? 'Flat amount per finished line; 29 CFR 778.112, 778.109'
        : 'Percentage of the finished line; 29 CFR 778.117',
      working: [
        ...(isFlat ? flatSteps(line, price, wholeCents) : percentSteps(line, price, wholeCents)),
        ...shareSteps(share, shares, wholeCents, amountCents),
      ],
    }),
  ];
}

/** What commission is a percentage of, cents: after discounts and, where the company takes it off, product cost. */
export function commissionBase({ commissionableCents, productCostCents = 0 }: DoneLine): number {
  return Math.max(0, commissionableCents - productCostCents);
}

export function centsOf(shares: readonly PersonShare[], person: PayPerson): number {
  return shares.find((item) => item.personId === person.id)?.cents ?? 0;
}

/** What ties a pay line to its job. */
export function jobOf({ jobId, jobNumber, visitId }: DoneLine): Pick<PayLine, 'jobId' | 'jobNumber' | 'visitId'> {
  return { jobId, jobNumber, visitId };
}

/** A line paid once for some piece of work, as a fixed amount that the crew shares: a job rate, a bonus per add-on. */
export function sharedAmount(
  share: LineShare,
  parts: Pick<PayLine, 'key' | 'label' | 'rule'> & { kind: PayLineKind; value: string; source: SourceRef },
): PayLine[] {
  const { person, line, split, zone } = share;
  const wholeCents = toCents(exact(parts.value));
  const shares = shareEarning(wholeCents, line.crew, split);
  const amountCents = centsOf(shares, person);
  if (amountCents === 0) return [];
  const { key, kind, label, rule, value, source } = parts;
  return [
    aLine({
      ...{ key, kind, label, rule, rate: value, amountCents },
      personId: person.id,
      workedOn: dayOf(line.doneAt, zone),
      inRegularRate: true,
      ...jobOf(line),
      working: [
        {
          label,
          note: `Job ${line.jobNumber}`,
          arithmetic: rateText(value),
          result: centsText(wholeCents),
          sources: [jobSource(line), source],
        },
        ...shareSteps(share, shares, wholeCents, amountCents),
      ],
    }),
  ];
}

const SPLIT_WORDS: Record<CrewSplit, string> = {
  equal: 'equally',
  weights: 'by weights',
  minutes: 'by minutes worked on the visit',
};

function shareSteps(
  { person, line, split }: LineShare,
  shares: readonly PersonShare[],
  wholeCents: number,
  amountCents: number,
): WorkingStep[] {
  if (!isShared(shares)) return [];
  return [
    {
      label: `The share of ${person.name}`,
      note: `${shares.length} in the crew, split ${SPLIT_WORDS[split]}; cents left over go to the largest remainder, ties by crew order`,
      arithmetic: `${shareWords(shares, person.id, split)} of ${centsText(wholeCents)}`,
      result: centsText(amountCents),
      sources: [{ kind: 'visit', id: line.visitId, label: `Crew of job ${line.jobNumber}` }],
    },
  ];
}

function flatSteps(line: DoneLine, { value, startsOn, source }: LinePrice, wholeCents: number): WorkingStep[] {
  return [
    {
      label: `${line.serviceName} finished`,
      note: `Job ${line.jobNumber}. Flat amount since ${formatDate(startsOn)}`,
      arithmetic: `1 line times ${rateText(value)}`,
      result: centsText(wholeCents),
      sources: [jobSource(line), source],
    },
  ];
}

function percentSteps(line: DoneLine, { value, startsOn, source }: LinePrice, wholeCents: number): WorkingStep[] {
  const percent = `${shortText(exact(value))} %`;
  return [
    {
      label: `What ${line.serviceName} sold for`,
      note: `Job ${line.jobNumber}. After discounts, before tax, tips and deposits`,
      arithmetic: centsText(line.commissionableCents),
      result: centsText(line.commissionableCents),
      sources: [jobSource(line)],
    },
    ...(line.productCostCents ? [costStep(line, line.productCostCents)] : []),
    {
      label: 'Commission on the line',
      note: `${percent} since ${formatDate(startsOn)}`,
      arithmetic: `${percent} of ${centsText(commissionBase(line))}`,
      result: centsText(wholeCents),
      sources: [source],
    },
  ];
}

function costStep(line: DoneLine, costCents: number): WorkingStep {
  return {
    label: 'Less its product cost',
    note: 'The company takes the service’s dated product cost off first',
    arithmetic: `${centsText(line.commissionableCents)} less ${centsText(costCents)}`,
    result: centsText(commissionBase(line)),
    sources: [],
  };
}

export function jobSource(line: DoneLine): SourceRef {
  return { kind: 'job', id: line.jobId, label: `Job ${line.jobNumber}` };
}
