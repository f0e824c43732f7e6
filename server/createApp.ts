/** The whole server as an Express application, from the parts that it is given. */
import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { Router } from 'express';
import type { Express } from 'express';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';

import { addAccountRoutes } from './account/routes';
import { addEntryRoutes } from './entries/routes';
import { addHandOverRoutes } from './handOver/routes';
import { addFileRoutes } from './files/routes';
import { addHealthRoutes } from './health/routes';
import { addHoldRoutes } from './holds/routes';
import { refuseCrossSite } from './http/refuseCrossSite';
import { serveWeb } from './http/serveWeb';
import { addInstrumentRoutes } from './instruments/routes';
import { addKeyRoutes } from './keys/routes';
import { addMachineRoutes } from './machines/routes';
import { addOpenApiRoutes } from './openapi/routes';
import type { Parts } from './parts';
import { addPeopleRoutes } from './people/routes';
import { answerProblems, ProblemError } from './problems';
import { addRecordRoutes } from './records/routes';
import { addRunRoutes } from './runs/routes';
import { makeConfirmPassword } from './session/confirmPassword';
import { addSessionRoutes } from './session/routes';
import { addSettingsRoutes } from './settings/routes';
import { addTreeRoutes } from './trees/routes';

/** Puts the application together. It listens to nothing and starts nothing by itself. */
export function createApp(parts: Parts): Express {
  const { config } = parts;
  const https = config.publicUrl?.startsWith('https:') === true;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use(
    pinoHttp({
      logger: parts.log,
      // Only what is needed to follow a request: no cookies, no bodies, so no password and no token can reach the log.
      serializers: {
        req: (req: { id: unknown; method: string; url: string }) => ({ id: req.id, method: req.method, url: req.url }),
        res: (res: { statusCode: number }) => ({ statusCode: res.statusCode }),
      },
      customLogLevel: (_req, res, error) => (error !== undefined || res.statusCode >= 500 ? 'error' : res.statusCode >= 400 ? 'info' : 'debug'),
    }),
  );
  app.use(
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: ["'self'"],
          // The client's style sheet is made in the page at run time.
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          workerSrc: ["'self'"],
          objectSrc: ["'none'"],
          baseUri: ["'none'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
          ...(https ? { upgradeInsecureRequests: [] } : {}),
        },
      },
      strictTransportSecurity: https ? { maxAge: 31_536_000, includeSubDomains: false } : false,
      referrerPolicy: { policy: 'no-referrer' },
    }),
  );
  app.use(compression());
  app.use(cookieParser());
  app.use(refuseCrossSite(config.publicUrl));

  const confirm = makeConfirmPassword(parts);
  const router = Router();
  addHealthRoutes(router, parts);
  addSessionRoutes(router, parts);
  addAccountRoutes(router, parts, confirm);
  addFileRoutes(router, parts);
  addMachineRoutes(router, parts);
  addTreeRoutes(router, parts);
  addInstrumentRoutes(router, parts);
  addPeopleRoutes(router, parts);
  addSettingsRoutes(router, parts);
  addRunRoutes(router, parts, confirm);
  addEntryRoutes(router, parts);
  addHoldRoutes(router, parts, confirm);
  addHandOverRoutes(router, parts, confirm);
  addRecordRoutes(router, parts, confirm);
  addKeyRoutes(router, parts);
  addOpenApiRoutes(router, parts);
  app.use(router);

  app.use(['/api', '/.well-known'], () => {
    throw new ProblemError('not-found', 'There is no such address.');
  });
  if (config.webRoot !== null) app.use(serveWeb(config.webRoot));
  app.use(() => {
    throw new ProblemError('not-found', 'There is no such address.');
  });
  app.use(answerProblems);
  return app;
}
