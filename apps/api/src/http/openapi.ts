import { problem } from '@strandnote/api/contract';
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
  });
}

function describe(route: Route): ZodOpenApiOperationObject {
  const parameters = [...route.path.matchAll(/:(\w+)/g)].map(([, name]) => ({
    name: name!,
    in: 'path' as const,
    required: true,
    schema: { type: 'string' as const },
  }));
  const reply = route.reply === 'file' ? {} : { content: { 'application/json': { schema: route.reply } } };
  return {
    summary: route.summary,
    description: route.access === 'public' ? 'Needs no account.' : `Act: ${route.access}`,
    parameters,
    ...(route.body ? { requestBody: { content: { 'application/json': { schema: route.body } } } } : {}),
    responses: {
      [String(route.status ?? 200)]: { description: route.summary, ...reply },
      default: { description: 'Why not', content: { 'application/problem+json': { schema: problem } } },
    },
  };
}
