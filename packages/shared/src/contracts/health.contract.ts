import { z } from 'zod';
import { endpoint } from './endpoint.ts';

export const getHealth = endpoint({
  method: 'get',
  path: '/api/health',
  roles: 'public',
  summary: 'Whether the service and its database answer.',
  response: z.object({ status: z.literal('ok') }),
});
export const getOpenApi = endpoint({
  method: 'get',
  path: '/api/openapi.json',
  roles: 'public',
  summary: 'This list of every route with the roles that may ask.',
  response: z.record(z.string(), z.unknown()),
});
