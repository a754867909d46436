import { lazy } from 'react';

export { keepBills } from './api/collect.queries.ts';

/** Fetched when a bill is opened: whoever comes in for something else does not carry it. */
export const BillSheet = lazy(async () => ({ default: (await import('./components/bill-sheet.tsx')).BillSheet }));
