import * as contract from '@strandnote/api/contract';
import { z } from 'zod';
import { createDocument, type ZodOpenApiOperationObject, type ZodOpenApiPathsObject } from 'zod-openapi';
import type { Route } from './route.ts';

/** The API in OpenAPI 3.1, from the schemas that parse its requests and replies. */
export function describeApi(routes: readonly Route[]) {
  const paths: ZodOpenApiPathsObject = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: describe(route) };
  }
  return createDocument({
    openapi: '3.1.0',
    info: { title: 'Strandnote', version: '1', description: 'Quantities are SI. Errors are Problem Details (RFC 9457) with a code.' },
    servers: [{ url: '/api/v1' }],
    paths,
    components: {
      schemas: namedSchemas(),
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'better-auth.session_token' } },
    },
  });
}

function describe(route: Route): ZodOpenApiOperationObject {
  const reply = route.reply === 'file' ? {} : { content: { 'application/json': { schema: route.reply } } };
  const { query } = route;
  return {
    summary: route.summary,
    description: route.access === 'public' ? 'Needs no account.' : `Act: ${route.access}`,
    requestParams: { path: pathParams(route), ...(query instanceof z.ZodObject ? { query } : {}) },
    ...(route.access === 'public' ? {} : { security: [{ session: [] }] }),
    ...(route.body ? { requestBody: { required: true, content: { 'application/json': { schema: route.body } } } } : {}),
    responses: {
      [String(route.status ?? 200)]: { description: route.summary, ...reply },
      default: { description: 'Why not', content: { 'application/problem+json': { schema: contract.problem } } },
    },
  };
}

function pathParams({ path, params }: Route): z.ZodObject {
  const own = params instanceof z.ZodObject ? params.shape : {};
  return z.object(path.startsWith('/firms/:firmId') ? { firmId: contract.id, ...own } : own);
}

/** The shapes of the contract under their own names, so that each is described once. */
function namedSchemas(): Record<string, z.ZodType> {
  const shapes = Object.entries<unknown>(contract).filter((entry): entry is [string, z.ZodObject] => entry[1] instanceof z.ZodObject);
  return Object.fromEntries(shapes.map(([name, schema]) => [name.charAt(0).toUpperCase() + name.slice(1), schema]));
}
