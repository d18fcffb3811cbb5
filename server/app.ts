import compression from 'compression';
import express, { type Express, Router } from 'express';
import type { Knex } from 'knex';
import type pg from 'pg';
import type { Logger } from 'pino';
import { accountRoutes } from './accounts/account-routes';
import { AccountService } from './accounts/account-service';
import { Passwords } from './accounts/passwords';
import { sessionRoutes } from './accounts/session-routes';
import { columnMapRoutes } from './column-maps/column-map-routes';
import { ColumnMapService } from './column-maps/column-map-service';
import { byHandRoutes } from './by-hand/by-hand-routes';
import { ByHandService } from './by-hand/by-hand-service';
import type { Configuration } from './configuration';
import type { NotifyHub } from './database/notify-hub';
import { exportRoutes } from './exports/export-routes';
import { ExportService } from './exports/export-service';
import { apiRoutes } from './http/api-routes';
import { notFound } from './http/app-error';
import { bearerTokens, unlessBearer } from './http/bearer';
import { errorHandler } from './http/error-handler';
import { EventStreams } from './http/event-streams';
import { healthRoutes } from './http/health-routes';
import { type Allowances, Limits } from './http/limits';
import { requestLog } from './http/request-log';
import { sameOriginOnly } from './http/same-origin';
import { securityHeaders } from './http/security-headers';
import { type Authenticator, makeAuthenticator, sessionHandlers } from './http/session';
import { SessionStore } from './http/session-store';
import { webClient } from './http/web-client';
import { ImportEvents } from './imports/import-events';
import { importRoutes } from './imports/import-routes';
import { ImportService } from './imports/import-service';
import { UploadService } from './imports/upload-service';
import { nightRoutes } from './nights/night-routes';
import { NightService } from './nights/night-service';
import { RigStateService } from './nights/rig-state-service';
import { RunSeriesService } from './nights/run-series-service';
import { operations } from './operations';
import { rigRoutes } from './rigs/rig-routes';
import { RigService } from './rigs/rig-service';
import { setupRoutes } from './setups/setup-routes';
import { SetupService } from './setups/setup-service';
import { accessTokenRoutes } from './tokens/access-token-routes';
import { AccessTokenService } from './tokens/access-token-service';

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

interface ResourceParts {
  readonly parts: AppParts;
  readonly authenticator: Authenticator;
  readonly streams: EventStreams;
  readonly limits: Limits;
  readonly tokens: AccessTokenService;
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
  app.use(requestLog(logger));
  const isHttps = configuration.PUBLIC_URL.startsWith('https:');
  app.use(securityHeaders(isHttps));
  app.use(compression());
  app.use(healthRoutes(() => answers(parts.knex)));

  const api = '/api/v1';
  const limits = new Limits(parts.pool, parts.allowances);
  const tokens = new AccessTokenService(parts.knex);
  // Who asks and from where, before any body is read.
  app.use(api, bearerTokens({ signIn: (token) => tokens.signIn(token), limits }));
  app.use(api, unlessBearer(sameOriginOnly(configuration.PUBLIC_URL)));
  app.use(api, (_req, res, next) => {
    res.set('Cache-Control', 'private, no-cache'); // what a person sees is nobody else's
    next();
  });
  app.use(apiRoutes(operations, isHttps));
  const authenticator = makeAuthenticator(store);
  const session = sessionHandlers(store, authenticator, configuration.SESSION_SECRET);
  app.use(api, ...session.map(unlessBearer));
  app.use(api, express.json({ limit: '256kb' }));
  app.use(resourceRoutes({ parts, authenticator, streams, limits, tokens }));
  app.use('/api', () => {
    throw notFound('address');
  });

  if (parts.webFolder !== null) app.use(webClient(parts.webFolder, isHttps));
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

/** Whether the database answers: a process that cannot reach it should get no requests. */
function answers(knex: Knex): Promise<boolean> {
  return knex.raw('SELECT 1').then(
    () => true,
    () => false,
  );
}

/** Each resource with its service. The paths are those of the contract, whole. */
function resourceRoutes(resources: ResourceParts): Router {
  const { parts, authenticator, streams, limits, tokens } = resources;
  const { knex, configuration } = parts;
  const accounts = new AccountService(knex, new Passwords(parts.passwordRounds));
  const imports = new ImportService(knex);
  const uploads = new UploadService(knex, configuration.UPLOAD_LIMIT_MIB);
  const events = new ImportEvents(imports, parts.hub, streams, parts.logger);
  const localMailUrl = configuration.LOCAL_MAIL_URL ?? null;
  return Router().use(
    accountRoutes({ accounts, limits, localMailUrl }),
    sessionRoutes({ accounts, authenticator, limits }),
    accessTokenRoutes(tokens),
    rigRoutes(new RigService(knex)),
    setupRoutes(new SetupService(knex)),
    columnMapRoutes(new ColumnMapService(knex)),
    importRoutes({ imports, uploads, events, limits }),
    nightRoutes({
      nights: new NightService(knex),
      rigStates: new RigStateService(knex),
      runSeries: new RunSeriesService(knex),
    }),
    byHandRoutes(new ByHandService(knex)),
    exportRoutes(new ExportService(knex)),
  );
}
