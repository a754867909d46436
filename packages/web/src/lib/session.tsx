import { createContext, useContext, useMemo } from 'react';
import type { ReactNode } from 'react';
import { AbilityProvider } from '@casl/react';
import type { RawRuleOf } from '@casl/ability';
import { abilityFrom } from '@driprail/shared/authz/ability';
import type { AppAbility } from '@driprail/shared/authz/ability';
import type { SessionDto } from '@driprail/shared/contracts/session.contract';

const SessionContext = createContext<SessionDto | null>(null);

/** Hands the signed-in user and their abilities, the very rules of the API, to the screens. */
export function SessionProvider({ session, children }: { session: SessionDto; children: ReactNode }) {
  const ability = useMemo(() => abilityFrom(session.rules as unknown as RawRuleOf<AppAbility>[]), [session.rules]);
  return (
    <SessionContext value={session}>
      <AbilityProvider value={ability}>{children}</AbilityProvider>
    </SessionContext>
  );
}

export function useSession(): SessionDto {
  const session = useContext(SessionContext);
  if (!session) throw new Error('useSession needs a signed-in screen');
  return session;
}
