import type { WhatIfBody, WhatIfWeek } from '@driprail/shared/contracts/pay-plans.contract';
import { computePayWeek, monthOfWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import { shareEarning } from '@driprail/shared/domain/pay/crew-shares';
import { OVERTIME_RULE_SETS } from '@driprail/shared/domain/pay/overtime-rule-sets';
import type { CarriedPay, PayWeekInput, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { trialInput } from '@driprail/shared/domain/pay/what-if';
import type { Trial } from '@driprail/shared/domain/pay/what-if';
import { addDays, weekNumberOf } from '@driprail/shared/domain/time/zone';
import type { Transaction } from 'sequelize';
import type { PayWeek } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { carryOn } from './carried.queries.ts';
import { frozenInput } from './frozen.queries.ts';
import { payInputOf } from './pay-input.queries.ts';
import { listPlaces } from './places.service.ts';
import { weekAt } from './weeks.service.ts';

/**
 * Past weeks of one person worked out again under a trial, oldest first. Locked weeks come from their snapshots, open
 * ones from today's records; what a trial plan carries goes on from week to week. Nothing is written.
 * @throws 404 for an unknown place, 422 for an unknown rule set
 */
export function tryWeeks(body: WhatIfBody, now: Date): Promise<WhatIfWeek[]> {
  return inTransaction(async (tx) => {
    const trial = await trialOf(body, tx);
    const weeks: WhatIfWeek[] = [];
    let carried: CarriedPay[] = [];
    let before: string | null = null;
    for (let day = body.from; day <= body.to || weeks.length === 0; day = addDays(day, 7)) {
      const week = await weekAt(day, tx);
      if (week.startsAt > now) break;
      const input = frozenInput(week) ?? (await payInputOf(week, now, tx));
      if (before === null) carried = input.carried.filter((item) => item.personId === body.personId);
      else if (monthOfWeek(before) !== monthOfWeek(week.startsOn)) carried = [];
      before = week.startsOn;
      const [tried] = computePayWeek({ ...trialInput(input, body.personId, trial), carried }).people;
      const paid = computePayWeek(onlyOf(input, body.personId)).people[0];
      carried = carryOn(body.personId, week.startsOn, carried[0], tried);
      if (paid && tried) weeks.push(sideBySide(week, input, paid, tried));
    }
    return weeks;
  });
}

function onlyOf(input: PayWeekInput, personId: string): PayWeekInput {
  return { ...input, settledCommissions: [], people: input.people.filter((person) => person.id === personId) };
}

async function trialOf(body: WhatIfBody, tx: Transaction): Promise<Trial> {
  const { hourly, percent, plan, minimumWage, crewSplit, placeId, ruleSetKey } = body;
  const place = await placeOf(placeId, ruleSetKey, tx);
  return { hourly, percent, plan, minimumWage, crewSplit, place };
}

async function placeOf(placeId: string | null, key: string | null, tx: Transaction): Promise<Trial['place']> {
  if (placeId !== null) {
    const [place] = await listPlaces(placeId, tx);
    if (!place) throw notFound('That place');
    return { placeId, name: place.name, ruleSet: place.ruleSet, minimumWages: place.minimumWages };
  }
  if (key === null) return null;
  const ruleSet = OVERTIME_RULE_SETS.find((set) => set.key === key);
  if (!ruleSet) {
    const message = 'Choose one of the listed rule sets.';
    throw unprocessable('unknown_rules', message, { fields: { ruleSetKey: message } });
  }
  return { placeId: key, name: ruleSet.name, ruleSet, minimumWages: [] };
}

function sideBySide(week: PayWeek, input: PayWeekInput, paid: PersonWeek, tried: PersonWeek): WhatIfWeek {
  return {
    startsOn: week.startsOn,
    number: weekNumberOf(week.startsOn),
    isLocked: week.state === 'locked',
    hours: paid.hoursWorked,
    soldCents: soldOf(input, paid.personId),
    asPaidCents: wages(paid),
    whatIfCents: wages(tried),
    asPaidPremiumCents: paid.totals.overtimePremium + paid.totals.makeUp,
    whatIfPremiumCents: tried.totals.overtimePremium + tried.totals.makeUp,
  };
}

function wages({ totals }: PersonWeek): number {
  return totals.gross - totals.tips - totals.adjustments;
}

/** The person's share of what finished lines sold for, cents. */
function soldOf({ doneLines, rules }: PayWeekInput, personId: string): number {
  return doneLines.reduce((total, line) => {
    const shares = shareEarning(line.commissionableCents, line.crew, rules.crewSplit);
    return total + (shares.find((share) => share.personId === personId)?.cents ?? 0);
  }, 0);
}
