import { z } from 'zod';
import { problemSchema } from '@/lib/contracts/common';
import { OPERATIONS, type Operation } from './operations';

/** What a route says of itself (lib/server/http/route.ts). */
export interface Takes {
  readonly role: string;
  readonly params?: z.ZodType;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType | 'none' | 'stream';
}

const METHODS = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const;
export type Method = (typeof METHODS)[number];

type JsonSchema = Record<string, unknown>;

/** The methods of a route's module, with what each takes. */
export function methodsOf(module: object): [Method, Takes][] {
  const exports = module as Partial<Record<Method, { takes?: Takes }>>;
  return METHODS.flatMap((method): [Method, Takes][] => {
    const takes = exports[method]?.takes;
    return takes ? [[method, takes]] : [];
  });
}

/**
 * The OpenAPI 3.1 document of all routes. What a request takes comes from the routes themselves, what they answer from the table of
 * operations; both are made of the same zod schemas that check every request.
 * @param routes module by folder under app/api.
 */
export function openApiDocument(routes: Readonly<Record<string, object>>, serverUrl: string): JsonSchema {
  const paths: Record<string, JsonSchema> = {};
  for (const [folder, module] of Object.entries(routes)) {
    const path = `/api/${folder.replace(/\[(\w+)\]/g, '{$1}')}`;
    paths[path] = Object.fromEntries(
      methodsOf(module).map(([method, takes]) => [method.toLowerCase(), operationOf(method, folder, takes)]),
    );
  }
  paths['/api/openapi'] = {
    get: {
      operationId: 'get_openapi',
      summary: 'This document',
      tags: ['openapi'],
      security: [],
      responses: {
        200: { description: 'This document', content: { 'application/json': { schema: { type: 'object' } } } },
      },
    },
  };
  return {
    openapi: '3.1.1',
    info: {
      title: 'Elbowroom API',
      version: '1',
      description:
        'Lengths in millimetres and angles in degrees unless a name says otherwise; x right, y away, z up. Send an API token as ' +
        '"Authorization: Bearer …". Refusals are problem documents (RFC 9457) with a stable member `code`. Figures are planning aids, ' +
        'no substitute for a risk assessment.',
    },
    servers: [{ url: serverUrl }],
    security: [{ token: [] }, { session: [] }],
    tags: [...new Set(Object.keys(routes).map(tagOf)), 'openapi'].map((name) => ({ name })),
    paths,
    components: {
      securitySchemes: {
        token: { type: 'http', scheme: 'bearer', description: 'An API token of the account menu.' },
        session: { type: 'apiKey', in: 'cookie', name: 'elbowroom-session', description: 'The cookie of a sign-in.' },
      },
      schemas: { Problem: jsonSchema(problemSchema, 'output') },
    },
  };
}

const tagOf = (folder: string): string => folder.split('/')[0];

function operationOf(method: Method, folder: string, takes: Takes): JsonSchema {
  const operation = OPERATIONS[`${method} ${folder}`];
  if (!operation) throw new Error(`The table of operations lacks ${method} ${folder}`);
  return {
    operationId: `${method.toLowerCase()}_${folder.replace(/[^\w]+/g, '_').replace(/_$/, '')}`,
    summary: operation.says,
    description: takes.role === 'public' ? 'Asks for no session.' : `For members who are at least ${takes.role}.`,
    tags: [tagOf(folder)],
    ...(takes.role === 'public' && { security: [] }),
    ...parametersOf(folder, takes),
    ...requestBodyOf(takes, operation),
    responses: responsesOf(takes, operation),
  };
}

function parametersOf(folder: string, { params, query }: Takes): JsonSchema {
  const places = membersOf(params);
  const inPath = [...folder.matchAll(/\[(\w+)\]/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: places.properties[name] ?? { type: 'string' },
  }));
  const asked = membersOf(query);
  const inQuery = Object.entries(asked.properties).map(([name, schema]) => ({
    name,
    in: 'query',
    required: asked.required.includes(name),
    schema,
  }));
  const parameters = [...inPath, ...inQuery];
  return parameters.length > 0 ? { parameters } : {};
}

function membersOf(schema: z.ZodType | undefined): { properties: Record<string, JsonSchema>; required: string[] } {
  const { properties, required } = (schema ? jsonSchema(schema, 'input') : {}) as {
    properties?: Record<string, JsonSchema>;
    required?: string[];
  };
  return { properties: properties ?? {}, required: required ?? [] };
}

function requestBodyOf({ body }: Takes, { sends }: Operation): JsonSchema {
  if (body === 'stream') {
    const mediaType = sends ?? 'application/octet-stream';
    return { requestBody: { required: true, content: { [mediaType]: { schema: streamSchema(mediaType) } } } };
  }
  if (body === undefined || body === 'none') return {};
  return { requestBody: { required: true, content: { 'application/json': { schema: jsonSchema(body, 'input') } } } };
}

function streamSchema(mediaType: string): JsonSchema {
  if (mediaType !== 'multipart/form-data') return { type: 'object' };
  const file = { type: 'string', contentMediaType: 'application/octet-stream' };
  return { type: 'object', required: ['file'], properties: { file, name: { type: 'string' } } };
}

function responsesOf({ role }: Takes, { answer, says, status = 200 }: Operation): JsonSchema {
  const problem = (description: string) => ({
    description,
    content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
  });
  const content =
    answer === null
      ? {}
      : typeof answer === 'string'
        ? { content: { [answer]: { schema: { type: 'string', contentMediaType: answer } } } }
        : { content: { 'application/json': { schema: jsonSchema(answer, 'output') } } };
  return {
    [status]: { description: says, ...content },
    ...(role !== 'public' && { 401: problem('Nobody is signed in'), 403: problem('Your role does not allow it') }),
    404: problem('It does not exist, or it is not yours'),
    422: problem('A field needs another value'),
    default: problem('Refused'),
  };
}

function jsonSchema(schema: z.ZodType, io: 'input' | 'output'): JsonSchema {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return rest;
}
