export { settingsRoutes } from './settings.routes.ts';
export { SetUpCode, hasDemoLogins, isSetUpNeeded, setUpCompany } from './set-up.service.ts';
