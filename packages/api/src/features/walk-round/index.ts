export { checkPhotoFiles } from './photo-files.queries.ts';
export { walkRoundRoutes } from './walk-round.routes.ts';
