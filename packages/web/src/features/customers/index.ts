export { CustomerForm } from './components/customer-form.tsx';
