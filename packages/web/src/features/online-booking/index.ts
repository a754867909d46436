export { OwnBooking } from './components/own-booking.tsx';
