import type { AppAbility } from '@driprail/shared/authz/ability';
import type { Actor } from '@driprail/shared/authz/actor';
import type { Clock } from '../clock.ts';

/** What a handler knows of who asks and when. */
export interface Ctx {
  actor: Actor;
  /** Shown beside what this login does. */
  name: string;
  ability: AppAbility;
  now: Clock;
}
