import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { done, email, id, instant, name, password, roleName } from './fields.ts';
import { everyone } from '../authz/actor.ts';

export const companyFacts = z.object({
  name: z.string(),
  phone: z.string(),
  zone: z.string(),
  clock: z.enum(['12', '24']),
  units: z.enum(['us', 'metric']),
  undoSeconds: z.int(),
  emergencyNumber: z.string(),
});
export type CompanyFacts = z.infer<typeof companyFacts>;

export const sessionDto = z.object({
  user: z.object({
    id,
    name: z.string(),
    email: z.string(),
    role: roleName,
    personId: id.nullable(),
    /** Rides in a crew and therefore has a run sheet. */
    ridesToday: z.boolean(),
  }),
  company: companyFacts,
  /** CASL rules of this user, as the API itself applies them. */
  rules: z.array(z.record(z.string(), z.unknown())),
  hasLocalMail: z.boolean(),
});
export type SessionDto = z.infer<typeof sessionDto>;

export const createSession = endpoint({
  method: 'post',
  path: '/api/session',
  roles: 'public',
  summary: 'Sign in with e-mail and password; sets the session cookie.',
  body: z.strictObject({ email, password: z.string().min(1, 'Give your password.').max(200) }),
  response: sessionDto,
});
export const getSession = endpoint({
  method: 'get',
  path: '/api/session',
  roles: everyone,
  summary: 'Who is signed in, and what that login may do.',
  response: sessionDto,
});
export const endSession = endpoint({
  method: 'delete',
  path: '/api/session',
  roles: everyone,
  summary: 'Sign out of this session.',
  response: done,
});
export const listSessions = endpoint({
  method: 'get',
  path: '/api/sessions',
  roles: everyone,
  summary: 'The places where this login is signed in.',
  response: z.object({
    sessions: z.array(
      z.object({
        ref: z.string(),
        isCurrent: z.boolean(),
        device: z.string(),
        signedInAt: instant,
        lastSeenAt: instant,
      }),
    ),
  }),
});
export const endOneSession = endpoint({
  method: 'delete',
  path: '/api/sessions/:ref',
  roles: everyone,
  summary: 'End one of one’s own sessions, its open screens included.',
  params: z.object({ ref: z.string().max(80) }),
  response: done,
});
export const changePassword = endpoint({
  method: 'post',
  path: '/api/password',
  roles: everyone,
  summary: 'Change one’s own password; ends the other sessions.',
  body: z.strictObject({ current: z.string().min(1, 'Give the password you use now.').max(200), next: password }),
  response: done,
});
export const requestReset = endpoint({
  method: 'post',
  path: '/api/password/reset-requests',
  roles: 'public',
  summary: 'Ask for a link to set a new password. Answers the same whether the address is known or not.',
  body: z.strictObject({ email }),
  response: done,
});
export const getLink = endpoint({
  method: 'get',
  path: '/api/links/:token',
  roles: 'public',
  summary: 'What an invitation or reset link is for, while it is good.',
  params: z.object({ token: z.string().max(100) }),
  response: z.object({ kind: z.enum(['invitation', 'reset']), email: z.string(), companyName: z.string() }),
});
export const useLink = endpoint({
  method: 'post',
  path: '/api/links/:token',
  roles: 'public',
  summary: 'Use an invitation or reset link once: sets the password and signs in.',
  params: z.object({ token: z.string().max(100) }),
  body: z.strictObject({ password }),
  response: sessionDto,
});

export const loginDto = z.object({
  id,
  name: z.string(),
  email: z.string(),
  role: roleName,
  personId: id.nullable(),
  isActive: z.boolean(),
  /** Invited, but no password set yet. */
  isInvited: z.boolean(),
  lastSeenAt: instant.nullable(),
});
export type LoginDto = z.infer<typeof loginDto>;
export const listLogins = endpoint({
  method: 'get',
  path: '/api/logins',
  roles: ['owner'],
  summary: 'Every login of the company.',
  response: z.object({ logins: z.array(loginDto) }),
});
export const inviteLogin = endpoint({
  method: 'post',
  path: '/api/logins',
  roles: ['owner'],
  summary: 'Invite a person by e-mail to a login with one role.',
  body: z.strictObject({ email, role: roleName, personId: id.nullable(), name }),
  response: z.object({ login: loginDto }),
});
export const updateLogin = endpoint({
  method: 'patch',
  path: '/api/logins/:id',
  roles: ['owner'],
  summary: 'Change a login’s e-mail or role, or switch it off at once, open screens included.',
  params: z.object({ id }),
  body: z.strictObject({ email: email.optional(), role: roleName.optional(), isActive: z.boolean().optional() }),
  response: z.object({ login: loginDto }),
});
export const sendReset = endpoint({
  method: 'post',
  path: '/api/logins/:id/reset',
  roles: ['owner'],
  summary: 'Send a person a link to set a new password.',
  params: z.object({ id }),
  response: done,
});
export const endLoginSessions = endpoint({
  method: 'delete',
  path: '/api/logins/:id/sessions',
  roles: ['owner'],
  summary: 'End all sessions of a login.',
  params: z.object({ id }),
  response: done,
});
