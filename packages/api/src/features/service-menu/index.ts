export { saveChecklist } from './checklists.service.ts';
export { listServices } from './services.queries.ts';
export { servicesRoutes } from './services.routes.ts';
export { createService } from './services.service.ts';
export { surchargesOfDay } from './surcharges.service.ts';
export type { PriceFields, ServiceFields } from './services.service.ts';
