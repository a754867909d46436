import * as api from '@driprail/shared/contracts/session.contract';
import type { LoginDto } from '@driprail/shared/contracts/session.contract';
import { User } from '../../db/models/index.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import type { AccessOptions } from './access.routes.ts';
import { endLoginSessions, inviteLogin, sendResetTo, updateLogin } from './logins.service.ts';

export function loginsRoutes(table: RouteTable, { baseUrlOf }: AccessOptions): void {
  route(table, api.listLogins, async () => ({
    logins: (await User.findAll({ order: [['name', 'ASC']] })).map(toLoginDto),
  }));
  route(table, api.inviteLogin, async ({ body }, ctx, { req }) => ({
    login: toLoginDto(await inviteLogin(ctx, body, baseUrlOf(req))),
  }));
  route(table, api.updateLogin, async ({ params, body }, ctx) => ({
    login: toLoginDto(await updateLogin(ctx, params.id, body)),
  }));
  route(table, api.sendReset, async ({ params }, ctx, { req }) => {
    await sendResetTo(ctx, params.id, baseUrlOf(req));
    return okay;
  });
  route(table, api.endLoginSessions, async ({ params }, ctx) => {
    await endLoginSessions(ctx, params.id);
    return okay;
  });
}

function toLoginDto(user: User): LoginDto {
  const { id, name, email, role, personId, isActive } = user;
  return {
    id,
    name,
    email,
    role,
    personId,
    isActive,
    isInvited: !user.passwordHash,
    lastSeenAt: user.lastSeenAt?.toISOString() ?? null,
  };
}
