export { boardRoutes } from './board.routes.ts';
export { boardSql, readVisits } from './board.queries.ts';
export { ownDay, visitFrom, visitJson } from './visit.sql.ts';
export { moveVisits } from './moves.service.ts';
export { placeVisit } from './place-visit.service.ts';
export { authorizeVisit, isTakenLate, nearness } from './visit-access.ts';
export { createVisit, lockVisit, removeVisit, setVisitLines, stretchVisit } from './visits.service.ts';
