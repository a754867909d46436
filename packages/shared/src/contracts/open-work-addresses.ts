import { addressOf } from './address.ts';
import type * as jobWork from './job-work.contract.ts';

/** What the desk asks of the work at the car; free of schemas, since the phone loads the same part of the web app. */
export const getOpenWorkAt = addressOf<typeof jobWork.getOpenWork>('get', '/api/open-work');
export const getVisitWorkAt = addressOf<typeof jobWork.getVisitWork>('get', '/api/visits/:id/work');
export const answerJobChangeAt = addressOf<typeof jobWork.answerJobChange>('post', '/api/changes/:id/answer');
