export { jobWorkRoutes } from './job-work.routes.ts';
export { fixChecklists, refuseUnconfirmed, refuseUnfinished } from './demands.ts';
