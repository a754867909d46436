export { jobsRoutes } from './jobs.routes.ts';
export { eraseJobNotes, moveJobs } from './job-customer.service.ts';
export { callOff, createJob, orderJob } from './jobs.service.ts';
export { putJobLines } from './put-job-lines.ts';
export type { JobFields } from './jobs.service.ts';
export { keepTip, recordTip } from './tips.service.ts';
