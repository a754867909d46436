export { onlineBookingRoutes } from './online-booking.routes.ts';
export { removeOverHolds } from './holds.service.ts';
