export { keepBills } from './api/collect.queries.ts';
