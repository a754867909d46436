export { OutboxLine } from './components/outbox-line.tsx';
