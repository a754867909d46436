export { keepWork } from './api/work.queries.ts';
export { partBefore } from './components/part-before.ts';
export { VisitWork } from './components/visit-work.tsx';
export { useWorkNeeds } from './components/use-work-needs.ts';
