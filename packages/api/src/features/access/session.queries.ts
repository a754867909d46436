import type { Transaction } from 'sequelize';
import { rulesFor } from '@driprail/shared/authz/ability';
import type { SessionDto } from '@driprail/shared/contracts/session.contract';
import { select } from '../../db/sequelize.ts';
import { CompanySettings } from '../../db/models/index.ts';
import type { SignedIn } from '../../http/route.ts';

/** Who is signed in, with the rules that the API applies to that login. */
export async function sessionOf(user: SignedIn, now: Date, hasLocalMail: boolean): Promise<SessionDto> {
  const company = await CompanySettings.findByPk(1, { rejectOnEmpty: true });
  const { id, name, email, role, personId } = user;
  return {
    user: {
      id,
      name,
      email,
      role,
      personId,
      ridesToday: role === 'technician' || (await rides(personId, now, company.zone)),
    },
    company: {
      name: company.name,
      phone: company.phone,
      zone: company.zone,
      clock: company.clock,
      units: company.units,
      undoSeconds: company.undoSeconds,
      emergencyNumber: company.emergencyNumber,
    },
    rules: rulesFor({ userId: id, personId, role }) as unknown as SessionDto['rules'],
    hasLocalMail: hasLocalMail && role === 'owner',
  };
}

async function rides(personId: string | null, now: Date, zone: string): Promise<boolean> {
  if (!personId) return false;
  const rows = await select(
    `SELECT 1 FROM van_crew WHERE person_id = :personId
       AND span && tstzrange(date_trunc('day', :now::timestamptz, :zone), date_trunc('day', :now::timestamptz, :zone) + interval '1 day')`,
    { personId, now, zone },
  );
  return rows.length > 0;
}

export interface SessionRow {
  sid: string;
  device: string | null;
  signedInAt: string | null;
  lastSeenAt: string | null;
}

export function sessionsOf(userId: string, tx?: Transaction): Promise<SessionRow[]> {
  return select<SessionRow>(
    `SELECT sid, sess->>'device' AS device, sess->>'signedInAt' AS "signedInAt", sess->>'lastSeenAt' AS "lastSeenAt"
       FROM session WHERE user_id = :userId AND expire > now() ORDER BY sess->>'lastSeenAt' DESC`,
    { userId },
    tx,
  );
}
