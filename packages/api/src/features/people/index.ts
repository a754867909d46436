export { peopleRoutes } from './people.routes.ts';
export { addTimeOff, createPerson } from './people.service.ts';
export { createVan } from './vans.service.ts';
export { setVanCrew } from './crews.service.ts';
