export { AddVisitSheet } from './components/add-visit-sheet.tsx';
export { CallBackSheet } from './components/call-back-sheet.tsx';
export { CallOffSheet } from './components/call-off-sheet.tsx';
export { JobSheet } from './components/job-sheet.tsx';
