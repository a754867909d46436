export { runSheetRoutes } from './run-sheet.routes.ts';
export { actOnVisit } from './visit-actions.service.ts';
