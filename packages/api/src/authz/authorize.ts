import type { AppAbility } from '@driprail/shared/authz/ability';
import type { Action } from '@driprail/shared/authz/subjects';
import { forbidden } from '../http/errors.ts';

type Subject = Parameters<AppAbility['can']>[1];

/** Refuses with 403 and the rule's own reason. Hand it complete records: an absent field would be allowed. */
export function authorize(ability: AppAbility, action: Action, subject: Subject): void {
  if (ability.can(action, subject)) return;
  throw forbidden(ability.relevantRuleFor(action, subject)?.reason);
}
