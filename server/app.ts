import compression from 'compression';
import express, { type Express, Router } from 'express';
import helmet from 'helmet';
import type { Knex } from 'knex';
import type pg from 'pg';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Configuration } from './configuration';
import type { NotifyHub } from './database/notify-hub';
import { notFound } from './http/app-error';
import { errorHandler } from './http/error-handler';
import { EventStreams } from './http/event-streams';
import { healthRoutes } from './http/health-routes';
import { type Allowances, Limits } from './http/limits';
import { sameOriginOnly } from './http/same-origin';
import { sessionHandlers } from './http/session';
import { SessionStore } from './http/session-store';
import { webClient } from './http/web-client';

export interface AppParts {
  readonly configuration: Configuration;
  readonly knex: Knex;
  /** For the session store and the limits, which speak plain SQL. */
  readonly pool: pg.Pool;
  readonly hub: NotifyHub;
  readonly logger: Logger;
  readonly allowances: Allowances;
  /** Cost of bcrypt: 12 in production, less in tests. */
  readonly passwordRounds: number;
  /** Folder of the built client; null where only the API is wanted. */
  readonly webFolder: string | null;
}

export interface App {
  readonly express: Express;
  /** Ends what would hold the server's close: event streams and timers. */
  close(): void;
}

/** The web application from its parts: the one place that builds services. */
export function buildApp(parts: AppParts): App {
  const { configuration, logger } = parts;
  const streams = new EventStreams();
  const store = new SessionStore(parts.pool, (...entries) => {
    logger.error({ entries }, 'session store');
  });

  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', configuration.TRUST_PROXY);
  app.set('query parser', 'simple'); // no nested objects in a query
  app.use(pinoHttp({ logger, autoLogging: { ignore: ({ url }) => url === '/healthz' } }));
  app.use(securityHeaders(configuration.PUBLIC_URL.startsWith('https:')));
  app.use(compression());
  app.use(healthRoutes(parts.knex));

  const api = '/api/v1';
  app.use(api, sameOriginOnly(configuration.PUBLIC_URL)); // before any body is read
  app.use(api, sessionHandlers(store, configuration.SESSION_SECRET));
  app.use(api, express.json({ limit: '256kb' }));
  app.use(resourceRoutes(parts, streams));
  app.use('/api', () => {
    throw notFound('address');
  });

  if (parts.webFolder !== null) app.use(webClient(parts.webFolder));
  app.use(() => {
    throw notFound('page');
  });
  app.use(errorHandler(logger));
  return {
    express: app,
    close: () => {
      streams.closeAll();
      store.close();
    },
  };
}

/** Each resource with its service. The paths are those of the contract, whole. */
function resourceRoutes(parts: AppParts, _streams: EventStreams): Router {
  const router = Router();
  const _limits = new Limits(parts.pool, parts.allowances);
  return router;
}

function securityHeaders(isHttps: boolean): ReturnType<typeof helmet> {
  const upgrade = isHttps ? { upgradeInsecureRequests: [] } : { upgradeInsecureRequests: null };
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...upgrade,
      },
    },
    strictTransportSecurity: isHttps,
  });
}
