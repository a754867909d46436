export { checkData } from './check-data.queries.ts';
export { importCsv } from './import.service.ts';
export type { ImportKind } from './import.service.ts';
