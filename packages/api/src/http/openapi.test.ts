import { expect, test } from 'vitest';
import type { Role } from '@driprail/shared/authz/actor';
import { useApp } from '../testing/app.ts';

const app = useApp();

interface Layer {
  route?: { path: string; methods: Record<string, boolean>; stack: unknown[] };
}

test('every mounted route is listed with the roles that may ask', async () => {
  const answer = await app.anonymous().get('/api/openapi.json').expect(200);
  const { paths } = answer.body as { paths: Record<string, Record<string, { 'x-roles': string[] }>> };
  const { stack } = app.app.table.router as unknown as { stack: Layer[] };
  const mounted = stack.flatMap(({ route }) =>
    route ? Object.keys(route.methods).map((method) => `${method} ${route.path.replace(/:(\w+)/g, '{$1}')}`) : [],
  );
  const listed = Object.entries(paths).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path}`),
  );
  expect(mounted.length).toBeGreaterThan(50);
  expect(mounted.filter((route) => !listed.includes(route))).toEqual([]);
  const known: (Role | 'public')[] = ['owner', 'dispatcher', 'technician', 'public'];
  for (const methods of Object.values(paths)) {
    for (const operation of Object.values(methods)) {
      expect(operation['x-roles'].length).toBeGreaterThan(0);
      expect(operation['x-roles'].every((role) => known.includes(role as Role))).toBe(true);
    }
  }
});
