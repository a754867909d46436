export { OutboxLine } from './components/outbox-line.tsx';
export { useOnline } from './components/phone-head.tsx';
