import { queryOptions, useMutation } from '@tanstack/react-query';
import { getOnlineSettings, updateOnlineSettings } from '@driprail/shared/contracts/online-booking.contract';
import type { OnlineSettingsBody } from '@driprail/shared/contracts/online-booking.contract';
import { listServices } from '@driprail/shared/contracts/services.contract';
import { call } from '../../../lib/call.ts';

/** The settings with the menu that they choose from. */
export const onlineSettingsQuery = queryOptions({
  queryKey: ['online-settings'],
  queryFn: async ({ signal }) => {
    const [{ settings }, { services }] = await Promise.all([
      call(getOnlineSettings, {}, signal),
      call(listServices, {}, signal),
    ]);
    return { settings, services: services.filter(({ isActive }) => isActive) };
  },
});

export function useSaveOnlineSettings() {
  return useMutation({
    mutationFn: (body: OnlineSettingsBody) => call(updateOnlineSettings, { body }),
    onSuccess: (_a, _v, _r, { client }) => client.invalidateQueries({ queryKey: ['online-settings'] }),
  });
}
