import { rateLimit } from 'express-rate-limit';
import * as api from '@driprail/shared/contracts/settings.contract';
import { CompanySettings } from '../../db/models/index.ts';
import type { RouteTable } from '../../http/route.ts';
import { publicRoute, route } from '../../http/route.ts';
import { begin } from '../access/index.ts';
import type { SetUpCode } from './set-up.service.ts';
import { isSetUpNeeded, refuseWrongCode, setUpCompany, tooManyCodes } from './set-up.service.ts';
import { toSettingsDto, updateSettings } from './settings.service.ts';

export function settingsRoutes(
  table: RouteTable,
  { code, hasLocalMail }: { code: SetUpCode; hasLocalMail: boolean },
): void {
  route(table, api.getSettings, async () => ({
    settings: toSettingsDto(await CompanySettings.findByPk(1, { rejectOnEmpty: true })),
  }));
  route(table, api.updateSettings, async ({ body }, ctx) => ({ settings: await updateSettings(ctx, body) }));
  publicRoute(table, api.getSetUp, async () => ({ isNeeded: await isSetUpNeeded() }));

  table.router.post(
    '/api/set-up',
    rateLimit({
      windowMs: 600_000,
      limit: 20,
      validate: { trustProxy: false },
      handler: (_q, _s, next) => next(tooManyCodes()),
    }),
  );
  publicRoute(table, api.completeSetUp, async ({ body }, now, { req }) => {
    refuseWrongCode(code, body.code);
    const user = await setUpCompany(body, now);
    code.spend();
    return begin(req, user, now, hasLocalMail);
  });
}
