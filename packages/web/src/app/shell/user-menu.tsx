import { useEffect, useRef, useState } from 'react';
import { useAbility } from '@casl/react';
import { Link, useLocation } from 'react-router';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { Icon } from '../../components/icon.tsx';
import { useSignOut } from '../../features/access/index.ts';
import { useOutbox } from '../../lib/outbox/outbox.ts';
import { useSession } from '../../lib/session.tsx';
import { chooseTheme, useTheme } from '../../lib/theme.ts';
import type { NavItem } from './nav-items.ts';
import { menuItems } from './nav-items.ts';

const themes = [
  ['day', 'Day'],
  ['night', 'Night'],
  ['sun', 'Sunlight'],
] as const;

/** One's name opens one's own things, the ground of the screens, and signing out; on a phone also the pages. */
export function UserMenu({ items }: { items: NavItem[] }) {
  const { user, hasLocalMail } = useSession();
  const ability = useAbility<AppAbility>();
  const location = useLocation();
  const [openAt, setOpenAt] = useState<string | null>(null);
  const isOpen = openAt === location.key;
  const box = useRef<HTMLDivElement>(null);
  const signOut = useSignOut();
  const { waiting } = useOutbox();
  const theme = useTheme();
  useEffect(() => {
    if (!isOpen) return undefined;
    const close = (event: MouseEvent | KeyboardEvent) => {
      if (event instanceof KeyboardEvent ? event.key === 'Escape' : !box.current?.contains(event.target as Node))
        setOpenAt(null);
    };
    document.addEventListener('mousedown', close);
    document.addEventListener('keydown', close);
    return () => {
      document.removeEventListener('mousedown', close);
      document.removeEventListener('keydown', close);
    };
  }, [isOpen]);
  return (
    <div ref={box} className="relative">
      <button
        type="button"
        className="who"
        aria-expanded={isOpen}
        aria-haspopup="true"
        onClick={() => setOpenAt(isOpen ? null : location.key)}
      >
        <span className="max-[900px]:hidden">{user.name}</span>
        <span className="min-[901px]:hidden">Menu</span> <small className="max-[900px]:hidden">{user.role}</small>
        <Icon name="down" className="!w-4 !h-4" />
      </button>
      {isOpen ? (
        <nav className="menu right-0 top-9" aria-label="More">
          <div className="min-[901px]:hidden">
            {items.map((item) => (
              <Link key={item.to} to={item.to}>
                {item.label}
              </Link>
            ))}
            <hr className="my-1 border-line" />
          </div>
          {menuItems(ability, hasLocalMail, user.personId).map((item) => (
            <Link key={item.to} to={item.to}>
              {item.label}
            </Link>
          ))}
          <hr className="my-1 border-line" />
          <div className="flex" role="group" aria-label="Ground">
            {themes.map(([value, label]) => (
              <button key={value} type="button" aria-pressed={theme === value} onClick={() => chooseTheme(value)}>
                <span className={theme === value ? 'font-bold underline' : ''}>{label}</span>
              </button>
            ))}
          </div>
          <hr className="my-1 border-line" />
          {waiting.length > 0 ? (
            <p className="tape my-1" role="status">
              {waiting.length} change{waiting.length === 1 ? ' is' : 's are'} not sent yet. They stay on this phone for
              you.
            </p>
          ) : null}
          <button type="button" onClick={() => signOut.mutate()}>
            {waiting.length > 0 ? 'Sign out all the same' : 'Sign out'}
          </button>
        </nav>
      ) : null}
    </div>
  );
}
