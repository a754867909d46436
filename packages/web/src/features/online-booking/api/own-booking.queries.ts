import { queryOptions, useMutation } from '@tanstack/react-query';
import { callOffOwn, getOwnBooking } from '@driprail/shared/contracts/online-booking.contract';
import { call } from '../../../lib/call.ts';

export const ownBookingQuery = (token: string) =>
  queryOptions({
    queryKey: ['own-booking', token],
    queryFn: ({ signal }) => call(getOwnBooking, { params: { token } }, signal),
    refetchInterval: 60_000,
  });

export function useCallOffOwn(token: string) {
  return useMutation({
    mutationFn: (feeCents: number) => call(callOffOwn, { params: { token }, body: { feeCents } }),
    // Also after a refusal: the fee shown may be an old one.
    onSettled: async (_d, _e, _v, _r, { client }) => {
      await client.invalidateQueries({ queryKey: ['own-booking', token] });
      await client.invalidateQueries({ queryKey: ['customer-page', token] });
    },
  });
}
