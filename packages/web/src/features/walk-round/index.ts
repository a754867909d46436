export { keepWalkSheets } from './api/walk-round.queries.ts';
export { StartSheet } from './components/start-sheet.tsx';
