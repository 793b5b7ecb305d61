import { z } from 'zod';
import { allEndpoints } from '../../shared/contracts/all';
import { type Endpoint, paramsOf } from '../../shared/contracts/endpoint';
import { type ErrorCode, errorCodes } from '../../shared/errors';

/** OpenAPI 3.1, made from the same declarations that the router reads. */
export function openApiDocument() {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const { tag, name, endpoint } of allEndpoints) {
    const path = endpoint.path.replace(/:([A-Za-z]+)/g, '{$1}');
    paths[path] ??= {};
    paths[path][endpoint.method] = operation(tag, name, endpoint);
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Tapeline', version: '1', description: 'A coaching team’s private library of training footage.' },
    servers: [{ url: '/api' }],
    paths,
    components: { schemas: { Error: errorSchema } },
  };
}

function operation(tag: string, name: string, endpoint: Endpoint) {
  const { body, query, file } = endpoint;
  return {
    operationId: name,
    tags: [tag],
    summary: endpoint.summary,
    'x-may': endpoint.may,
    parameters: [
      ...paramsOf(endpoint.path).map((param) => ({
        name: param,
        in: 'path',
        required: true,
        schema: param.endsWith('Id') ? { type: 'string', format: 'uuid' } : { type: 'string' },
      })),
      ...(query ? queryParameters(query) : []),
    ],
    ...(file
      ? {
          requestBody: {
            required: true,
            content: {
              'multipart/form-data': {
                schema: {
                  allOf: [
                    { type: 'object', required: ['file'], properties: { file: { type: 'string', format: 'binary' } } },
                    ...(body ? [schemaOf(body)] : []),
                  ],
                },
              },
            },
          },
        }
      : body
        ? { requestBody: { required: true, content: { 'application/json': { schema: schemaOf(body) } } } }
        : {}),
    responses: {
      [endpoint.status ?? 200]: {
        description: 'Done',
        content: { [endpoint.answers ?? 'application/json']: { schema: schemaOf(endpoint.response, 'output') } },
      },
      ...errorsOf(endpoint),
    },
  };
}

function queryParameters(query: z.ZodObject) {
  const schema = schemaOf(query) as { properties?: Record<string, unknown>; required?: string[] };
  return Object.entries(schema.properties ?? {}).map(([name, property]) => ({
    name,
    in: 'query',
    required: schema.required?.includes(name) ?? false,
    schema: property,
  }));
}

function errorsOf(endpoint: Endpoint) {
  const codes = new Set<ErrorCode>(['tooOften', ...(endpoint.errors ?? [])]);
  if (endpoint.body || endpoint.query || endpoint.file) codes.add('invalid');
  if (endpoint.may !== 'anyone') codes.add('signInFirst');
  if (endpoint.path.includes('/teams/')) codes.add('notAllowed').add('notFound');
  const byStatus = new Map<number, ErrorCode[]>();
  for (const code of codes) {
    const status = errorCodes[code][0];
    byStatus.set(status, [...(byStatus.get(status) ?? []), code]);
  }
  return Object.fromEntries(
    [...byStatus].map(([status, named]) => [
      status,
      {
        description: named.join(', '),
        content: { 'application/json': { schema: { $ref: '#/components/schemas/Error' } } },
      },
    ]),
  );
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output' = 'input') {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { target: 'draft-2020-12', io, unrepresentable: 'any' });
  return rest;
}

const errorSchema = {
  type: 'object',
  required: ['error'],
  properties: {
    error: {
      type: 'object',
      required: ['code', 'message', 'requestId'],
      properties: {
        code: { type: 'string', enum: Object.keys(errorCodes) },
        message: { type: 'string' },
        fields: { type: 'object', additionalProperties: { type: 'string' } },
        current: {},
        requestId: { type: 'string' },
      },
    },
  },
};
