import type { ServerResponse } from 'node:http';
import { toNodeHandler } from 'better-auth/node';
import express, { type Express, type RequestHandler } from 'express';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { identityPaths } from './access/auth.ts';
import { describeError, describeRequest } from './create-log.ts';
import type { AppDeps } from './deps.ts';
import { errorHandler } from './http/error-handler.ts';
import { AppError } from './http/errors.ts';
import { requireOwnOrigin } from './http/own-origin.ts';
import { registerRoutes } from './http/register-routes.ts';
import { serveWebApp } from './http/web-app.ts';
import { routes } from './routes.ts';

const logged = {
  req: describeRequest,
  res: ({ statusCode }: ServerResponse) => ({ status: statusCode }),
  err: describeError,
};

/** The whole server as one Express application. */
export function createApp(deps: AppDeps): Express {
  const app = express();
  const trust = deps.env.TRUST_PROXY;
  app.set('trust proxy', /^\d+$/.test(trust) ? Number(trust) : trust);
  app.disable('x-powered-by');
  app.use(pinoHttp({ logger: deps.log, wrapSerializers: false, serializers: logged }));
  app.use(securityHeaders(deps));
  // One reader's data, and refusals, stay with no cache; a file that may be kept says so itself.
  app.use('/api', (_request, response, next) => {
    response.set('Cache-Control', 'no-store');
    next();
  });
  app.use('/api', requireOwnOrigin(deps.env));
  // Before express.json(): better-auth reads the body itself.
  app.all('/api/auth/*splat', onlyIdentityPaths, tellAddress, toNodeHandler(deps.auth));
  app.use('/api/v1', express.json({ limit: '2mb' }), registerRoutes(deps, routes));
  app.use('/api', refuseAddress);
  if (deps.env.WEB_ROOT !== undefined) app.use(serveWebApp(deps.env.WEB_ROOT));
  app.use(refuseAddress);
  app.use(errorHandler);
  return app;
}

function securityHeaders(deps: AppDeps): RequestHandler {
  const secure = deps.env.publicUrl.startsWith('https:');
  return helmet({
    contentSecurityPolicy: {
      directives: {
        'default-src': ["'self'"],
        'script-src': ["'self'"],
        // React Native Web and expo-font write their styles into a style element.
        'style-src': ["'self'", "'unsafe-inline'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'font-src': ["'self'", 'data:'],
        'connect-src': ["'self'"],
        'frame-ancestors': ["'none'"],
        'upgrade-insecure-requests': secure ? [] : null,
      },
    },
    strictTransportSecurity: secure,
    referrerPolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
  });
}

const onlyIdentityPaths: RequestHandler = (request, response, next) => {
  const path = request.path.replace(/^\/api\/auth/, '');
  if (!identityPaths.some((allowed) => allowed === path)) return refuseAddress(request, response, next);
  next();
};

const refuseAddress: RequestHandler = () => {
  throw new AppError('not-found', 'There is no such address here.');
};

/** The address that rate limits count by comes from Express, which knows the trusted proxies; a header of the caller's does not count. */
const tellAddress: RequestHandler = (request, _response, next) => {
  request.headers['x-strandnote-client'] = request.ip ?? 'unknown';
  next();
};
