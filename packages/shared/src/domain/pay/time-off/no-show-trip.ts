import { exact } from '../../money/exact.ts';
import { centsText, toCents } from '../../money/rounding.ts';
import { formatDate } from '../../time/format.ts';
import { dayOf } from '../../time/zone.ts';
import { isShared, shareEarning, shareWords } from '../crew-shares.ts';
import { aLine } from '../pay-line.ts';
import type { CrewShare, CrewSplit, PayLine, PayPerson } from '../pay-week.types.ts';
import { rateText } from '../working-words.ts';
import { showUpRuleOn, type DatedShowUpRule } from './show-up-rule.ts';

/** A visit called off after the crew had arrived, because nobody was home. */
export interface NoShowTrip {
  visitId: string;
  jobId: string;
  jobNumber: number;
  calledOffAt: string;
  crew: CrewShare[];
}

interface TripWeek {
  person: PayPerson;
  trips: readonly NoShowTrip[];
  rules: readonly DatedShowUpRule[];
  placeId: string | null;
  split: CrewSplit;
  zone: string;
}

/**
 * A fixed amount for each trip, in place of what the job would have paid. It pays for work that was done, so it counts
 * in the regular rate and toward the minimum wage (29 CFR 778.109). Trainees have no share, as with every job.
 */
export function noShowTripLines({ person, trips, rules, placeId, split, zone }: TripWeek): PayLine[] {
  return trips.flatMap((trip) => {
    const on = dayOf(trip.calledOffAt, zone);
    const dated = showUpRuleOn(rules, 'no_show_trip', placeId, on);
    if (dated === null) return [];
    const { dollars, isShared: sharesIt } = dated.rule;
    const wholeCents = toCents(exact(dollars));
    const shares = shareEarning(wholeCents, trip.crew, split);
    const own = shares.find((share) => share.personId === person.id);
    const amountCents = own === undefined ? 0 : sharesIt ? own.cents : wholeCents;
    if (amountCents === 0) return [];
    const job = { kind: 'job', id: trip.jobId, label: `Job ${trip.jobNumber}` } as const;
    const rule = { kind: 'rule', id: dated.id, label: `No-show trip, ${rateText(dollars)}` } as const;
    return [
      aLine({
        key: `no_show_trip:${trip.visitId}`,
        personId: person.id,
        kind: 'no_show_trip',
        label: 'Trip, nobody home',
        workedOn: on,
        rate: dollars,
        amountCents,
        inRegularRate: true,
        ...{ jobId: trip.jobId, jobNumber: trip.jobNumber, visitId: trip.visitId },
        rule: 'Fixed amount for a trip; pay for work done counts in the regular rate, 29 CFR 778.109',
        working: [
          {
            label: 'Called off after arrival, nobody home',
            note: `Job ${trip.jobNumber}. ${sharesIt ? 'Shared in the crew' : 'To each of the crew'}, since ${formatDate(dated.startsOn)}`,
            arithmetic: `1 trip times ${rateText(dollars)}`,
            result: centsText(wholeCents),
            sources: [job, rule],
          },
          ...(sharesIt && isShared(shares)
            ? [
                {
                  label: `The share of ${person.name}`,
                  note: `${shares.length} in the crew`,
                  arithmetic: `${shareWords(shares, person.id, split)} of ${centsText(wholeCents)}`,
                  result: centsText(amountCents),
                  sources: [{ kind: 'visit', id: trip.visitId, label: `Crew of job ${trip.jobNumber}` } as const],
                },
              ]
            : []),
        ],
      }),
    ];
  });
}
