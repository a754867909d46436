import type { AppAbility } from '@driprail/shared/authz/ability';
import { paths } from '../paths.ts';

export interface NavItem {
  to: string;
  label: string;
}

/** What a login may open, in the order of the work; the abilities decide, as they do in the API. */
export function navItems(ability: AppAbility, rides: boolean): NavItem[] {
  const items: (NavItem | false)[] = [
    ability.can('plan', 'Visit') && { to: paths.board, label: 'Board' },
    rides && { to: paths.runSheet, label: 'Run sheet' },
    ability.can('read', 'Customer') && { to: paths.customers, label: 'Customers' },
    ability.can('read', 'Customer') && { to: paths.messages, label: 'Messages' },
    ability.can('read', 'Service') && { to: paths.services, label: 'Service menu' },
    ability.can('update', 'Van') && { to: paths.vans, label: 'Vans' },
    ability.can('update', 'Person') && { to: paths.people, label: 'People' },
    ability.can('update', 'ClockEntry') && { to: paths.hours, label: 'Hours' },
    ability.can('read', 'Cash') && { to: paths.money, label: 'Money' },
    ability.can('read', 'PayWeek') && { to: paths.payWeeks, label: 'Pay week' },
  ];
  return items.filter((item): item is NavItem => item !== false);
}

export function menuItems(ability: AppAbility, hasLocalMail: boolean, personId: string | null): NavItem[] {
  const items: (NavItem | false)[] = [
    personId !== null && { to: paths.statements, label: 'My pay' },
    ability.can('read', 'Payday') && { to: paths.paydays, label: 'Paydays' },
    ability.can('read', 'Rate') && { to: paths.rates, label: 'Rates and pay rules' },
    ability.can('update', 'Settings') && { to: paths.settings, label: 'Settings' },
    ability.can('read', 'Login') && { to: paths.logins, label: 'Logins' },
    ability.can('read', 'AuditEntry') && { to: paths.records, label: 'Records' },
    hasLocalMail && { to: paths.localMail, label: 'Local mail' },
    { to: paths.firstAid, label: 'First help' },
    { to: paths.account, label: 'Account and sessions' },
  ];
  return items.filter((item): item is NavItem => item !== false);
}
