export { runSheetQuery } from './api/run-sheet.queries.ts';
export { NotYours } from './components/not-yours.tsx';
export { OutboxLine } from './components/outbox-line.tsx';
