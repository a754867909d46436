export { AddVisitSheet } from './components/add-visit-sheet.tsx';
export { CallOffSheet } from './components/call-off-sheet.tsx';
export { JobSheet } from './components/job-sheet.tsx';
