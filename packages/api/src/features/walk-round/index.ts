export { walkRoundRoutes } from './walk-round.routes.ts';
