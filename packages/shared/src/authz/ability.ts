import { AbilityBuilder, createMongoAbility, subject } from '@casl/ability';
import type { ForcedSubject, MongoAbility, RawRuleOf } from '@casl/ability';
import type { Actor, Role } from './actor.ts';
import type { Action, SubjectFields, SubjectName } from './subjects.ts';

type Tagged = { [N in SubjectName]: SubjectFields[N] & ForcedSubject<N> }[SubjectName];
export type AppAbility = MongoAbility<[Action, SubjectName | Tagged]>;
type Allow = AbilityBuilder<AppAbility>['can'];

/** A technician sees visits from yesterday to two days ahead. */
export const NEAR_DAYS = { back: 1, ahead: 2 } as const;
/** A press made while its visit was near is still taken so many days later: a phone may lie dead for a while. */
export const LATE_DAYS = 14;

const planned: SubjectName[] = ['Visit', 'Job', 'Customer', 'Person', 'Van'];

const rulesByRole: Record<Role, (actor: Actor, allow: Allow) => void> = {
  owner(_actor, allow) {
    for (const name of planned) allow(['read', 'create', 'update', 'remove', 'plan', 'mark', 'tip'], name);
    allow(['read', 'create', 'collect', 'refund'], 'Bill');
    allow(['read', 'create'], 'Cash');
    allow(['read', 'create', 'update'], 'Service');
    allow(['read', 'create', 'update'], 'ClockEntry');
    allow(['read', 'update'], 'Settings');
    allow(['read', 'create'], 'Rate');
    allow(['read', 'update'], 'PayWeek');
    allow('read', 'Statement');
    allow('read', 'TimeOffBalance');
    allow(['read', 'create', 'update', 'remove'], 'Payday');
    allow('read', 'PayRecord');
    allow(['read', 'create', 'update'], 'Login');
    allow('read', 'LocalMail');
    allow('read', 'AuditEntry');
    allow('erase', 'Customer');
  },
  dispatcher(actor, allow) {
    for (const name of planned) allow(['read', 'create', 'update', 'remove', 'plan', 'mark', 'tip'], name);
    allow(['read', 'create', 'collect'], 'Bill');
    allow(['read', 'create'], 'Cash');
    allow('read', 'Service');
    allow(['read', 'create', 'update'], 'ClockEntry');
    allow('read', 'Settings');
    ownStatements(actor, allow);
  },
  technician(actor, allow) {
    allow('read', 'Settings');
    allow('read', 'Van');
    if (!actor.personId) return;
    allow('read', 'Visit', ownNear(actor.personId, NEAR_DAYS.ahead));
    allow('mark', 'Visit', ownNear(actor.personId, 0));
    allow('read', 'Bill', ownNear(actor.personId, NEAR_DAYS.ahead));
    allow('collect', 'Bill', ownNear(actor.personId, 0));
    allow('tip', 'Job', { crewPersonIds: { $all: [actor.personId] } });
    allow(['read', 'create'], 'ClockEntry', { personId: actor.personId });
    ownStatements(actor, allow);
    allow('read', 'Estimate', { personId: actor.personId });
  },
};

/** Null compares as zero, so a visit without a day is left out by name. */
function ownNear(personId: string, daysAhead: number) {
  return {
    crewPersonIds: { $all: [personId] },
    day: { $ne: null },
    daysFromToday: { $gte: -NEAR_DAYS.back, $lte: daysAhead },
  };
}

function ownStatements(actor: Actor, allow: Allow): void {
  if (!actor.personId) return;
  allow('read', 'Statement', { personId: actor.personId, state: 'locked' });
  allow('read', 'TimeOffBalance', { personId: actor.personId });
  allow('read', 'PayRecord', { personId: actor.personId });
}

/** The rules of a login; the API applies them and hands the same ones to its screens. */
export function rulesFor(actor: Actor): RawRuleOf<AppAbility>[] {
  const { can, rules } = new AbilityBuilder<AppAbility>(createMongoAbility);
  rulesByRole[actor.role](actor, can);
  return rules;
}

export function abilityFrom(rules: RawRuleOf<AppAbility>[]): AppAbility {
  return createMongoAbility<AppAbility>(rules);
}

export function abilityFor(actor: Actor): AppAbility {
  return abilityFrom(rulesFor(actor));
}

/** Names a record for the ability; a copy, since CASL writes on what it tags. */
export function tag<N extends SubjectName>(name: N, record: SubjectFields[N]): Tagged {
  return subject(name as string, { ...record }) as unknown as Tagged;
}
