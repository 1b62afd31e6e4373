/** The description of the API (OpenAPI 3.1), made from the same table and schemas that the server runs on. */
import { z } from 'zod';
import { ProblemDetails } from '../../../shared/problems/problems';
import type { Route } from './routes';

type Json = Record<string, unknown>;

const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json =>
  z.toJSONSchema(schema, { io, unrepresentable: 'any', target: 'draft-2020-12' }) as Json;

const content = (schema: z.ZodType, io: 'input' | 'output'): Json => ({
  'application/json': { schema: schemaOf(schema, io) },
});

export function describeApi(routes: readonly Route[], title: string): Json {
  const paths: Record<string, Json> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: describeRoute(route) };
  }
  return { openapi: '3.1.0', info: { title, version: '1' }, paths };
}

function describeRoute(route: Route): Json {
  const success = String(route.status ?? (route.answer ? 200 : 204));
  return {
    summary: route.summary,
    tags: [route.path.split('/')[2]],
    'x-may': route.may,
    parameters: [...parametersOf(route.params, 'path'), ...parametersOf(route.query, 'query'), ...versionHeader(route)],
    ...(route.body ? { requestBody: { required: true, content: content(route.body, 'input') } } : {}),
    responses: {
      [success]: { description: route.summary, ...(route.answer ? { content: content(route.answer, 'output') } : {}) },
      default: {
        description: 'What went wrong (RFC 9457)',
        content: { 'application/problem+json': { schema: schemaOf(ProblemDetails, 'output') } },
      },
    },
  };
}

function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as { properties?: Json; required?: string[] };
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }));
}

function versionHeader(route: Route): Json[] {
  if (!route.versioned) return [];
  return [
    {
      name: 'If-Match',
      in: 'header',
      required: true,
      schema: { type: 'string' },
      description: 'The version that is changed',
    },
  ];
}
