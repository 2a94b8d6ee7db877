import { z } from 'zod';
import { errorBody } from '#shared/api/errors.ts';
import { boundEndpoints } from './endpointList.ts';

let made: ReturnType<typeof makePage> | null = null;

/** OpenAPI 3.1 from the very schemas the server checks with (zod's own JSON Schema), made once. */
export function openApiPage() {
  made ??= makePage();
  return made;
}

function makePage() {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const { endpoint, ability } of boundEndpoints()) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] ??= {};
    paths[path][endpoint.method.toLowerCase()] = {
      summary: endpoint.summary,
      'x-ability': ability,
      parameters: [
        ...parametersOf(endpoint.params, 'path'),
        ...parametersOf(endpoint.query, 'query'),
      ],
      ...(endpoint.method !== 'GET' && {
        requestBody: {
          content: { 'application/json': { schema: schemaOf(endpoint.body, 'input') } },
        },
      }),
      responses: {
        200: {
          description: 'Done',
          content: { 'application/json': { schema: schemaOf(endpoint.response, 'output') } },
        },
        default: {
          description: 'An error',
          content: { 'application/json': { schema: schemaOf(errorBody, 'output') } },
        },
      },
    };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Furlong',
      version: '1',
      description: 'Every use-case of the app, from its own schemas.',
    },
    paths,
  };
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output') {
  return z.toJSONSchema(schema, { io, unrepresentable: 'any' });
}

function parametersOf(schema: z.ZodType, place: 'path' | 'query') {
  const json = schemaOf(schema, 'input') as {
    properties?: Record<string, object>;
    required?: string[];
  };
  return Object.entries(json.properties ?? {}).map(([name, value]) => ({
    name,
    in: place,
    required: place === 'path' || (json.required ?? []).includes(name),
    schema: value,
  }));
}
