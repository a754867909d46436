import type { AppAbility } from '@driprail/shared/authz/ability';
import type { Actor, Role } from '@driprail/shared/authz/actor';
import type { Clock } from '../clock.ts';

/** Who does something: a login, or a customer who has none. */
export interface Doer {
  actor: { userId: string | null; role: Role | 'customer' };
  name: string;
  now: Clock;
}

/** What a handler knows of who asks and when. */
export interface Ctx {
  actor: Actor;
  /** Shown beside what this login does. */
  name: string;
  ability: AppAbility;
  now: Clock;
}
