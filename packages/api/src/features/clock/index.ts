export { clockRoutes } from './clock.routes.ts';
export { clockOfPerson } from './clock.queries.ts';
export { followProgress, switchClock } from './switch-clock.ts';
