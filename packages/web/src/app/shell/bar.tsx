import { useAbility } from '@casl/react';
import { NavLink } from 'react-router';
import type { AppAbility } from '@driprail/shared/authz/ability';
import type { Role } from '@driprail/shared/authz/actor';
import { Logo } from '../../components/logo.tsx';
import { useSession } from '../../lib/session.tsx';
import { useIsLive } from '../../lib/socket.ts';
import { Find } from './find.tsx';
import { navItems } from './nav-items.ts';
import { UserMenu } from './user-menu.tsx';

/** The bar of the desk: where one is, one box to find anything, whether the screen is live, who is signed in. */
export function Bar({ role }: { role: Role }) {
  const { user } = useSession();
  const ability = useAbility<AppAbility>();
  const isLive = useIsLive();
  const items = navItems(ability, user.ridesToday);
  return (
    <header className="bar">
      <NavLink to="/" className="plain" aria-label="Driprail, start">
        <Logo className="logo" />
      </NavLink>
      <nav aria-label="Main" className="max-[900px]:!hidden">
        {items.map((item) => (
          <NavLink key={item.to} to={item.to}>
            {item.label}
          </NavLink>
        ))}
      </nav>
      <span className="sp" />
      {role === 'technician' ? null : <Find />}
      <span className={isLive ? 'sync' : 'sync is-adrift'} role="status">
        <i />
        <span className="max-[900px]:sr-only">{isLive ? 'Live' : 'Not live, catching up'}</span>
      </span>
      <UserMenu items={items} />
    </header>
  );
}
