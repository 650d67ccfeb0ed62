import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { type RequestHandler, Router } from 'express';

/**
 * The exported app. Hashed files are kept for a year, and go out as they were compressed at export; a page load of any address
 * answers with the app's one page.
 */
export function serveWebApp(root: string): Router {
  const router = Router();
  const hashed = { immutable: true, maxAge: '1y', fallthrough: false, dotfiles: 'allow' } as const;
  router.use(precompressed(root));
  router.use('/_expo', express.static(join(root, '_expo'), hashed));
  // Fonts lie under a folder that begins with a dot.
  router.use('/assets', express.static(join(root, 'assets'), hashed));
  router.use(express.static(root, { index: false, maxAge: 0, dotfiles: 'ignore' }));
  router.get('/{*splat}', (request, response, next) => {
    if (!request.get('accept')?.includes('text/html')) return next();
    response.set('Cache-Control', 'no-cache').sendFile('index.html', { root });
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
};

/** Sends the .br or .gz beside a file where the browser takes it. */
function precompressed(root: string): RequestHandler {
  return (request, response, next) => {
    const extension = /\.(\w+)$/.exec(request.path)?.[1] ?? '';
    if (request.method !== 'GET' || !(extension in types) || request.path.includes('..')) return next();
    const accepted = request.acceptsEncodings('br', 'gzip');
    const suffix = accepted === 'br' ? '.br' : accepted === 'gzip' ? '.gz' : null;
    const compressed = suffix === null ? null : decodeURIComponent(request.path) + suffix;
    if (compressed === null || !existsSync(join(root, compressed))) return next();
    response
      .set('Content-Encoding', accepted as string)
      .set('Vary', 'Accept-Encoding')
      .type(types[extension]!);
    const kept = /^\/(_expo|assets)\//.test(request.path) ? { immutable: true, maxAge: '1y' } : { maxAge: 0 };
    response.sendFile(compressed, { root, dotfiles: 'allow', ...kept }, (error) => (error ? next(error) : undefined));
  };
}
