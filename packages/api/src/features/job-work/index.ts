export { jobWorkRoutes } from './job-work.routes.ts';
export { eraseSaidYes } from './erase-customer.service.ts';
export { fixChecklists, refuseUnconfirmed, refuseUnfinished } from './demands.ts';
