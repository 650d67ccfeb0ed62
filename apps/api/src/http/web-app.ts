import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { type Request, type RequestHandler, type Response, Router } from 'express';

const forAYear = { immutable: true, maxAge: '1y' } as const;

/**
 * The exported app. Hashed files are kept for a year, and go out as they were compressed at export; a page load of any address
 * answers with the app's one page.
 */
export function serveWebApp(root: string): Router {
  const router = Router();
  const hashed = { ...forAYear, fallthrough: false, dotfiles: 'allow' } as const;
  router.use(precompressed(root));
  router.use('/_expo', express.static(join(root, '_expo'), hashed));
  // Fonts lie under a folder that begins with a dot.
  router.use('/assets', express.static(join(root, 'assets'), hashed));
  router.use(express.static(root, { index: false, maxAge: 0, dotfiles: 'ignore' }));
  router.get('/{*splat}', (request, response, next) => {
    if (!request.get('accept')?.includes('text/html')) return next();
    response.set('Cache-Control', 'no-cache');
    if (!sendCompressed(root, '/index.html', { request, response })) response.sendFile('index.html', { root });
  });
  return router;
}

const types: Record<string, string> = {
  js: 'text/javascript',
  css: 'text/css',
  json: 'application/json',
  svg: 'image/svg+xml',
  ttf: 'font/ttf',
  html: 'text/html',
  webmanifest: 'application/manifest+json',
};

/** The better one first, whatever order the browser names them in. */
const codings = [
  { name: 'br', suffix: '.br' },
  { name: 'gzip', suffix: '.gz' },
];

function precompressed(root: string): RequestHandler {
  return (request, response, next) => {
    const path = decoded(request.path);
    if (path === null || path.includes('..') || (request.method !== 'GET' && request.method !== 'HEAD')) return next();
    if (!sendCompressed(root, path, { request, response })) next();
  };
}

function decoded(path: string): string | null {
  try {
    return decodeURIComponent(path);
  } catch {
    return null;
  }
}

/** Sends the .br or .gz beside a file where the browser takes it. @returns whether there was one */
function sendCompressed(root: string, path: string, { request, response }: { request: Request; response: Response }): boolean {
  const type = types[/\.(\w+)$/.exec(path)?.[1] ?? ''];
  const coding = codings.find(({ name, suffix }) => request.acceptsEncodings(name) && existsSync(join(root, path + suffix)));
  if (!type || !coding) return false;
  response.set('Content-Encoding', coding.name).set('Vary', 'Accept-Encoding').type(type);
  const kept = /^\/(_expo|assets)\//.test(path) ? forAYear : { cacheControl: false };
  if (kept !== forAYear && !response.hasHeader('Cache-Control')) response.set('Cache-Control', 'no-cache');
  response.sendFile(path + coding.suffix, { root, dotfiles: 'allow', ...kept });
  return true;
}
