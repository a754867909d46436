export { changeSession, sessionKey, sessionQuery, useSignOut } from './api/session.queries.ts';
