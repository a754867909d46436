export { runSheetQuery } from './api/run-sheet.queries.ts';
export { OutboxLine } from './components/outbox-line.tsx';
