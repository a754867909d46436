import { dollars, exact, type Exact } from '../money/exact.ts';
import { centsText, shortText, toCents } from '../money/rounding.ts';
import { formatDate } from '../time/format.ts';
import { dayOf } from '../time/zone.ts';
import { isShared, shareEarning, shareWords } from './crew-shares.ts';
import { rateInForce } from './dated-rates.ts';
import { aLine } from './pay-line.ts';
import type { CrewSplit, DatedRate, DoneLine, PayLine, PayPerson, WorkingStep } from './pay-week.types.ts';
import { rateSource, rateText } from './working-words.ts';

/**
 * Flat and commission pay of one person for a finished job line. Each applies where a dated rate had started; a
 * percentage of 0 means none. The whole line's amount is rounded half up, then shared in the crew.
 */
export function jobLinePay(
  person: PayPerson,
  line: DoneLine,
  rates: readonly DatedRate[],
  split: CrewSplit,
  zone: string,
): PayLine[] {
  const workedOn = dayOf(line.doneAt, zone);
  return (['flat_service', 'commission_percent'] as const).flatMap((kind) => {
    const rate = rateInForce(rates, {
      kind,
      personId: person.id,
      serviceId: line.serviceId,
      clockKind: null,
      date: workedOn,
    });
    const value = rate === null ? null : exact(rate.value);
    return rate === null || value === null || value.lte(0)
      ? []
      : earning({ person, line, rate, value, split, workedOn });
  });
}

interface Earning {
  person: PayPerson;
  line: DoneLine;
  rate: DatedRate;
  value: Exact;
  split: CrewSplit;
  workedOn: string;
}

function earning({ person, line, rate, value, split, workedOn }: Earning): PayLine[] {
  const isFlat = rate.kind === 'flat_service';
  const wholeCents = toCents(isFlat ? value : dollars(line.commissionableCents).mul(value).div(100));
  const shares = shareEarning(wholeCents, line.crew, split);
  const amountCents = shares.find((item) => item.personId === person.id)?.cents ?? 0;
  if (amountCents === 0) return [];
  const working = isFlat ? flatSteps(line, rate, wholeCents) : percentSteps(line, rate, wholeCents);
  if (isShared(shares)) {
    const part = shareWords(shares, person.id, split);
    working.push({
      label: `The share of ${person.name}`,
      note: `${shares.length} in the crew, split ${SPLIT_WORDS[split]}; cents left over go to the largest remainder, ties by crew order`,
      arithmetic: `${part} of ${centsText(wholeCents)}`,
      result: centsText(amountCents),
      sources: [{ kind: 'visit', id: line.visitId, label: `Crew of job ${line.jobNumber}` }],
    });
  }
  return [
    aLine({
      key: `${isFlat ? 'flat' : 'commission'}:${line.lineId}`,
      personId: person.id,
      kind: isFlat ? 'flat' : 'commission',
      label: line.serviceName,
      workedOn,
      rate: rate.value,
      amountCents,
      inRegularRate: true,
      jobId: line.jobId,
      jobNumber: line.jobNumber,
      visitId: line.visitId,
      rule: isFlat
        ? 'Flat amount per finished line; 29 CFR 778.112, 778.109'
        : 'Percentage of the finished line; 29 CFR 778.117',
      working,
    }),
  ];
}

const SPLIT_WORDS: Record<CrewSplit, string> = {
  equal: 'equally',
  weights: 'by weights',
  minutes: 'by minutes worked on the visit',
};

function flatSteps(line: DoneLine, rate: DatedRate, wholeCents: number): WorkingStep[] {
  return [
    {
      label: `${line.serviceName} finished`,
      note: `Job ${line.jobNumber}. Flat amount since ${formatDate(rate.startsOn)}`,
      arithmetic: `1 line times ${rateText(rate.value)}`,
      result: centsText(wholeCents),
      sources: [jobSource(line), rateSource(rate)],
    },
  ];
}

function percentSteps(line: DoneLine, rate: DatedRate, wholeCents: number): WorkingStep[] {
  const percent = `${shortText(exact(rate.value))} %`;
  return [
    {
      label: `What ${line.serviceName} sold for`,
      note: `Job ${line.jobNumber}. After discounts, before tax, tips and deposits`,
      arithmetic: centsText(line.commissionableCents),
      result: centsText(line.commissionableCents),
      sources: [jobSource(line)],
    },
    {
      label: 'Commission on the line',
      note: `${percent} since ${formatDate(rate.startsOn)}`,
      arithmetic: `${percent} of ${centsText(line.commissionableCents)}`,
      result: centsText(wholeCents),
      sources: [rateSource(rate)],
    },
  ];
}

function jobSource(line: DoneLine): WorkingStep['sources'][number] {
  return { kind: 'job', id: line.jobId, label: `Job ${line.jobNumber}` };
}
