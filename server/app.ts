import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import type { Logger } from 'pino';
import type { DataSource } from 'typeorm';
import { accessRoutes } from './access/access.routes';
import { AccessService } from './access/access.service';
import { AccessTokens } from './access/access-token';
import { Tablets } from './access/tablets';
import { AttachmentsService } from './attachments/attachments.service';
import { attachmentsRoutes } from './attachments/attachments.routes';
import type { Config } from './config';
import { healthRoutes } from './health/health.routes';
import { answerErrors, answerUnknownAddress } from './http/answer-errors';
import { logRequests } from './http/log-requests';
import { mountRoutes } from './http/mount-routes';
import type { Route } from './http/route';
import { securityHeaders } from './http/security-headers';
import { serveApp } from './http/serve-app';
import { withOpenApi } from './openapi/openapi.routes';
import { proceduresRoutes } from './procedures/procedures.routes';
import { CompiledProcedures, ProceduresService } from './procedures/procedures.service';
import { recordsRoutes } from './records/records.routes';
import { RecordsService } from './records/records.service';
import { Countersigner } from './sync/countersigner';
import { RunIntake } from './sync/run-intake';
import { ServerKeys } from './sync/server-keys';
import { syncRoutes } from './sync/sync.routes';
import { SyncService } from './sync/sync.service';
import { VisitsService } from './visits/visits.service';

/** What the app is made of; nothing in here is opened or closed by it. */
export interface AppDeps {
  readonly config: Pick<Config, 'tokenSecret' | 'isDemo' | 'appDir' | 'tls' | 'publicUrl'>;
  readonly database: DataSource;
  readonly log: Logger;
  readonly clock: () => Date;
  /** Which build of the core computes here. */
  readonly build: string;
  readonly isStopping: () => boolean;
}

export interface App {
  readonly express: Express;
  /** Every route with its roles: what is mounted, what OpenAPI describes and what the tests walk. */
  readonly routes: readonly Route[];
}

/** Wires the whole server together. No side effects. */
export function createApp({ config, database, log, clock, build, isStopping }: AppDeps): App {
  const accessTokens = new AccessTokens(config.tokenSecret, clock);
  const isHttps = config.tls !== undefined || config.publicUrl?.protocol === 'https:';
  const reached = { isDemo: config.isDemo, isHttps };
  const tablets = new Tablets(database, clock);
  const countersigner = new Countersigner(new ServerKeys(config.tokenSecret, clock), clock);
  const runs = new RunIntake(database, new CompiledProcedures(), countersigner, clock, build);
  const routes = withOpenApi([
    ...healthRoutes(database, isStopping),
    ...accessRoutes(new AccessService(database, accessTokens, clock), tablets, reached),
    ...syncRoutes(new SyncService(database, tablets, new VisitsService(database, clock), runs, clock)),
    ...attachmentsRoutes(new AttachmentsService(database, clock)),
    ...proceduresRoutes(new ProceduresService(database, clock)),
    ...recordsRoutes(new RecordsService(database)),
  ]);
  const app = express();
  app.disable('x-powered-by');
  app.use(logRequests(log), ...securityHeaders(reached), compression(), cookieParser());
  mountRoutes(app, routes, (authorization) => accessTokens.read(authorization));
  app.use(serveApp(config.appDir));
  app.use(answerUnknownAddress);
  app.use(answerErrors(log));
  return { express: app, routes };
}
