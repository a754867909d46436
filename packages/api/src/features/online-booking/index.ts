export { onlineBookingRoutes } from './online-booking.routes.ts';
export { removeOverHolds } from './holds.service.ts';
export { readVanDays, vanDaysSql } from './van-days.queries.ts';
export { readWindows } from './windows.queries.ts';
