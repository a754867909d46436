export { CustomerMessages } from './components/customer-messages.tsx';
