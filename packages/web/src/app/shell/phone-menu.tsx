import type { AppAbility } from '@driprail/shared/authz/ability';
import { useSession } from '../../lib/session.tsx';
import { navItems } from './nav-items.ts';
import { UserMenu } from './user-menu.tsx';

/** The one menu of the phone pages, which have no bar. */
export function PhoneMenu({ ability }: { ability: AppAbility }) {
  const { user } = useSession();
  return <UserMenu items={navItems(ability, user.ridesToday)} />;
}
