import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import type { Logger } from 'pino';
import type { Config } from './config';
import type { Database } from './database/Database';
import { accountRoutes } from './features/accounts/accountRoutes';
import { createAccountService } from './features/accounts/accountService';
import { createPasswords } from './features/accounts/passwords';
import { createRefreshCookie } from './features/accounts/refreshCookie';
import { createSessionService } from './features/accounts/sessionService';
import { apertureRoutes } from './features/apertures/apertureRoutes';
import { createApertureService } from './features/apertures/apertureService';
import { benchRoutes } from './features/benches/benchRoutes';
import { createBenchService } from './features/benches/benchService';
import { cameraRoutes } from './features/cameras/cameraRoutes';
import { createCameraService } from './features/cameras/cameraService';
import { captureRoutes } from './features/captures/captureRoutes';
import { createCaptureService } from './features/captures/captureService';
import { clientRoutes } from './features/clients/clientRoutes';
import { createClientService } from './features/clients/clientService';
import { eventRoutes } from './features/events/eventRoutes';
import type { ProgressHub } from './features/events/startProgressHub';
import { frameRoutes } from './features/frames/frameRoutes';
import { createFrameService } from './features/frames/frameService';
import { laserRoutes } from './features/lasers/laserRoutes';
import { createLaserService } from './features/lasers/laserService';
import { lotRoutes } from './features/lots/lotRoutes';
import { createLotService } from './features/lots/lotService';
import { measurementRoutes } from './features/measurements/measurementRoutes';
import { createMeasurementService } from './features/measurements/measurementService';
import { createInvitationService } from './features/people/invitationService';
import { peopleRoutes } from './features/people/peopleRoutes';
import { createPeopleService } from './features/people/peopleService';
import { todayRoutes } from './features/today/todayRoutes';
import { createTodayService } from './features/today/todayService';
import type { DemoSignIn } from './features/welcome/knownSignIns';
import { welcomeRoutes } from './features/welcome/welcomeRoutes';
import { accessStands } from './features/accounts/sessionRepository';
import { createAccessTokens } from './http/accessTokens';
import { Api } from './http/Api';
import { Background } from './http/Background';
import { logRequests } from './http/logging';
import { problemHandler } from './http/problemHandler';
import { notFound } from './http/ProblemError';
import { createRateLimits } from './http/rateLimits';
import { securityHeaders } from './http/securityHeaders';
import { webBuild } from './http/webBuild';
import { createMailTexts } from './mail/mailTexts';
import type { FakeInbox } from './mail/startFakeInbox';
import { createQueue } from './worker/queue/createQueue';

/** Largest JSON body, bytes; frames come by other means. */
const MAX_JSON_BYTES = 1024 * 1024;

export interface AppDependencies {
  config: Pick<Config, 'publicUrl' | 'tokenSecret' | 'demo' | 'passwordCost' | 'rateLimitFactor'>;
  database: Database;
  log: Logger;
  /** Folder of the exported web application; null: the API alone. */
  webDir: string | null;
  inbox: FakeInbox | null;
  demoSignIns: readonly DemoSignIn[];
  /** What happens in a laboratory, for its event streams. */
  progress: Pick<ProgressHub, 'join'>;
  now?: () => Date;
}

export interface App {
  express: Express;
  /** `METHOD /path` of every endpoint that has a handler. */
  registered: ReadonlySet<string>;
  /** Work that goes on after its answer. */
  background: Background;
  /** Ends the open event streams. */
  endStreams(): void;
}

/** Puts the application together from what it is given; it opens nothing by itself. */
export function createApp(dependencies: AppDependencies): App {
  const { config, database, log, inbox, demoSignIns, webDir, progress, now = () => new Date() } = dependencies;
  const tokens = createAccessTokens(config.tokenSecret);
  const passwords = createPasswords(config.passwordCost);
  const mailTexts = createMailTexts(config.publicUrl);
  const sessions = createSessionService({ database, tokens, log, now });
  const accounts = createAccountService({ database, sessions, passwords, mailTexts, log, now });
  const cookie = createRefreshCookie(config.publicUrl.startsWith('https:'));
  const limits = createRateLimits(config.rateLimitFactor);
  const background = new Background(log);

  const api = new Api(tokens, (actor) => accessStands(database, actor));
  welcomeRoutes(api, { database, demo: config.demo, demoSignIns, inbox });
  accountRoutes(api, { accounts, sessions, cookie, limits, background });
  peopleRoutes(api, {
    people: createPeopleService({ database, now }),
    invitations: createInvitationService({ database, sessions, passwords, mailTexts, now }),
    cookie,
    limits,
  });
  laserRoutes(api, createLaserService(database));
  cameraRoutes(api, createCameraService(database));
  benchRoutes(api, createBenchService(database));
  clientRoutes(api, createClientService(database));
  lotRoutes(api, createLotService(database));
  apertureRoutes(api, createApertureService(database));
  todayRoutes(api, createTodayService({ database, now }));
  const queue = createQueue();
  captureRoutes(api, database, createCaptureService({ database, queue }));
  frameRoutes(api, createFrameService(database));
  measurementRoutes(api, createMeasurementService({ database, queue }));
  eventRoutes(api, progress);

  const app = express();
  app.disable('x-powered-by');
  app.use(logRequests(log), securityHeaders(), compression());
  app.use('/api', express.json({ limit: MAX_JSON_BYTES }), cookieParser(), api.router);
  app.use('/api', (_request, _response, next) => next(notFound('address')));
  if (webDir !== null) app.use(webBuild(webDir));
  app.use((_request, _response, next) => next(notFound('address')));
  app.use(problemHandler);
  return { express: app, registered: api.registered, background, endStreams: () => api.endStreams() };
}
