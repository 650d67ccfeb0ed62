import { z } from 'zod';
import { describeApi } from './openapi.ts';
import { publicRoute, type Route } from './route.ts';

/** The description of the API, and a plain page that reads it out. Both are made from the same routes that are served. */
export function docsRoutes(routes: () => readonly Route[]): Route[] {
  let description: ReturnType<typeof describeApi> | undefined;
  return [
    publicRoute({
      method: 'get',
      path: '/health',
      summary: 'Whether the server answers',
      reply: z.object({ ok: z.literal(true) }),
      handle: async () => ({ ok: true }) as const,
    }),
    publicRoute({
      method: 'get',
      path: '/openapi.json',
      summary: 'This description of the API (OpenAPI 3.1)',
      reply: 'file',
      handle: async ({ response }) => {
        description ??= describeApi(routes());
        response.json(description);
      },
    }),
    publicRoute({
      method: 'get',
      path: '/docs',
      summary: 'The description of the API as a page',
      reply: 'file',
      handle: async ({ response }) => {
        response.type('html').send(docsPage(routes()));
      },
    }),
  ];
}

function docsPage(routes: readonly Route[]): string {
  const rows = routes.map(
    (route) =>
      `<tr><td><code>${route.method.toUpperCase()}</code></td><td><code>/api/v1${escapeHtml(route.path)}</code></td><td>${escapeHtml(route.summary)}</td><td>${escapeHtml(route.access)}</td></tr>`,
  );
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Strandnote API</title>
<style>body{font:16px/1.5 sans-serif;margin:2rem;max-width:80rem}table{border-collapse:collapse}td,th{text-align:left;padding:.25rem .75rem;border-bottom:1px solid #cfd3cc}</style></head>
<body><h1>Strandnote API</h1><p>Schemas of requests and replies: <a href="/api/v1/openapi.json">openapi.json</a>. Quantities are SI. Errors are Problem Details (RFC 9457) with a <code>code</code>.</p>
<table><thead><tr><th>Method</th><th>Path</th><th>What it does</th><th>Act</th></tr></thead><tbody>${rows.join('')}</tbody></table></body></html>`;
}

function escapeHtml(text: string): string {
  return text.replace(/&/g, '&amp;').replace(/</g, '&lt;');
}
