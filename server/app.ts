import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { tileRouter } from '#server/area/tileRouter.ts';
import { clock } from '#server/clock.ts';
import { database } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { env } from '#server/env.ts';
import { answerErrors, answerUnknown } from '#server/http/answerErrors.ts';
import { refuseOtherOrigins } from '#server/http/csrf.ts';
import { openApiPage } from '#server/http/openApiPage.ts';
import { refuseOtherHosts } from '#server/http/refuseOtherHosts.ts';
import { serveClient } from '#server/http/serveClient.ts';
import { readActor } from '#server/http/sessionCookies.ts';
import { log, logSerializers } from '#server/log.ts';
import { areaRoutes } from '#server/routes/areaRoutes.ts';
import { arrivalRoutes } from '#server/routes/arrivalRoutes.ts';
import { dayRoutes } from '#server/routes/dayRoutes.ts';
import { forecastRoutes } from '#server/routes/forecastRoutes.ts';
import { householdRoutes } from '#server/routes/householdRoutes.ts';
import { memberRoutes } from '#server/routes/memberRoutes.ts';
import { learningRoutes } from '#server/routes/learningRoutes.ts';
import { reviewRoutes } from '#server/routes/reviewRoutes.ts';
import { runRoutes } from '#server/routes/runRoutes.ts';
import { sessionRoutes } from '#server/routes/sessionRoutes.ts';
import { setupRoutes } from '#server/routes/setupRoutes.ts';
import { styleRoutes } from '#server/routes/styleRoutes.ts';
import { textRoutes } from '#server/routes/textRoutes.ts';
import { visitRoutes } from '#server/routes/visitRoutes.ts';
import { webhookRoutes } from '#server/routes/webhookRoutes.ts';

/** The whole server without a port: tests drive it directly. */
export function buildApp(): Express {
  const app = express();
  app.disable('x-powered-by');
  // One proxy in front when there is a public address; its X-Forwarded-* are then true.
  app.set('trust proxy', env.publicUrl ? 1 : false);
  app.use((req, _res, next) => {
    req.id = newId();
    next();
  });
  app.use(
    pinoHttp({
      logger: log,
      genReqId: (req) => req.id,
      autoLogging: !env.isTest,
      serializers: logSerializers,
    }),
  );
  app.use(helmet(headers));
  app.use(refuseOtherHosts);
  app.use(tileRouter());
  app.use(compression());
  app.use(webhookRoutes);
  app.use(cookieParser());
  app.use('/api', refuseOtherOrigins, express.json({ limit: '1mb' }), readActor);
  app.get('/api/health', async (_req, res) => {
    await database.authenticate();
    res.json({ ready: true, now: clock.now().toISOString() });
  });
  app.get('/api/docs', (_req, res) => void res.json(openApiPage()));
  for (const routes of [
    sessionRoutes,
    memberRoutes,
    setupRoutes,
    areaRoutes,
    householdRoutes,
    styleRoutes,
    forecastRoutes,
    visitRoutes,
    dayRoutes,
    runRoutes,
    textRoutes,
    reviewRoutes,
    learningRoutes,
    arrivalRoutes,
  ])
    app.use(routes);
  app.use('/api', answerUnknown);
  app.use(serveClient());
  app.use(answerErrors);
  return app;
}

const headers: Parameters<typeof helmet>[0] = {
  contentSecurityPolicy: {
    directives: {
      defaultSrc: ["'self'"],
      scriptSrc: ["'self'"],
      // Leaflet positions its tiles and React its strips with style attributes.
      styleSrc: ["'self'", "'unsafe-inline'"],
      imgSrc: ["'self'", 'data:', 'blob:'],
      connectSrc: ["'self'"],
      workerSrc: ["'self'", 'blob:'],
      objectSrc: ["'none'"],
      frameAncestors: ["'none'"],
      upgradeInsecureRequests: env.publicUrl?.startsWith('https:') ? [] : null,
    },
  },
  strictTransportSecurity: env.publicUrl?.startsWith('https:') ? { maxAge: 31_536_000 } : false,
  crossOriginEmbedderPolicy: false,
  referrerPolicy: { policy: 'same-origin' },
};
