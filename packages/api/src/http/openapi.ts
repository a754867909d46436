import { z } from 'zod';
import type { Endpoint } from '@driprail/shared/contracts/endpoint';

/** An OpenAPI 3.1 description of the mounted endpoints; `x-roles` says who may ask. */
export function openApiOf(endpoints: Endpoint[]): Record<string, unknown> {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] ??= {};
    paths[path][endpoint.method] = operation(endpoint);
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Driprail', version: '0.1.0', license: { name: 'GPL-3.0-or-later' } },
    paths,
  };
}

function operation(endpoint: Endpoint): Record<string, unknown> {
  const type = {
    json: 'application/json',
    csv: 'text/csv',
    pdf: 'application/pdf',
    zip: 'application/zip',
    jpeg: 'image/jpeg',
  }[endpoint.format];
  const body = schemaOf(endpoint.body, 'input');
  return {
    summary: endpoint.summary,
    'x-roles': endpoint.roles === 'public' ? ['public'] : [...endpoint.roles],
    parameters: [...parameters(endpoint.params, 'path'), ...parameters(endpoint.query, 'query')],
    ...(Object.keys(body).length > 0 && {
      requestBody: { required: true, content: { 'application/json': { schema: body } } },
    }),
    responses: {
      '200': { description: 'The answer.', content: { [type]: { schema: schemaOf(endpoint.response, 'output') } } },
      default: { description: 'A refusal: {error: {code, message, fields?, hint?}}.' },
    },
  };
}

function parameters(schema: z.ZodType, place: 'path' | 'query'): unknown[] {
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as {
    properties?: Record<string, unknown>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, part]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: part,
  }));
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Record<string, unknown> {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return rest;
}
