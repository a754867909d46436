export { settingsRoutes } from './settings.routes.ts';
export { SetUpCode, isSetUpNeeded, setUpCompany } from './set-up.service.ts';
