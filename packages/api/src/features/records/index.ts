export { checkData } from './check-data.queries.ts';
export { recordsRoutes } from './records.routes.ts';
export { importCsv } from './import.service.ts';
export type { ImportKind } from './import.service.ts';
