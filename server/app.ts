import compression from 'compression';
import express, { type Express } from 'express';
import helmet from 'helmet';
import { join } from 'node:path';
import pinoHttp from 'pino-http';
import { apiRoutes } from '@/server/api-routes';
import type { AppDependencies } from '@/server/app-dependencies';
import { nothingHere, problemResponses } from '@/server/http/problem-response';
import { RequestCounts } from '@/server/http/request-counts';
import { requestIdOf, withRequestId } from '@/server/http/request-id';
import { serveSchemas, serveWeb } from '@/server/http/serve-web';
import { crawlerRoutes } from '@/server/routes/crawlers';
import { healthRoutes } from '@/server/routes/health';
import { outboxRoutes } from '@/server/routes/outbox';
import { pageRoutes } from '@/server/routes/pages';

/** Where `npm run build` puts the web client. */
const WEB_FOLDER = join(__dirname, '..', 'dist');

/** The whole web application: no port, no state outside of what is given. */
export function buildApp(dependencies: AppDependencies): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false);
  app.set('query parser', 'simple');
  app.set('trust proxy', dependencies.config.trustProxy);

  const requests = new RequestCounts();
  app.use(requests.count, withRequestId, requestLog(dependencies), securityHeaders(dependencies), compressed());
  app.use(healthRoutes(dependencies, requests));
  app.use('/api/v1', apiRoutes(dependencies));
  app.use(serveSchemas());
  if (!dependencies.config.production) app.use(outboxRoutes(dependencies));
  app.use(crawlerRoutes(dependencies), pageRoutes(dependencies, WEB_FOLDER), serveWeb(WEB_FOLDER));
  app.use(nothingHere);
  app.use(problemResponses(dependencies.log));
  return app;
}

/** One line a request. The query is left out: it may hold a key or a token. */
function requestLog({ log }: AppDependencies): express.RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: (req) => requestIdOf(req) ?? '',
    serializers: {
      req: (req: { id: string; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        path: req.url.split('?')[0],
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
    },
  });
}

function securityHeaders({ config }: AppDependencies): express.RequestHandler {
  const secure = config.publicUrl.startsWith('https:');
  return helmet({
    strictTransportSecurity: secure,
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        // react-native-web writes its styles into the page.
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
  });
}

/** Everything that gains by it, exports too, but never a stream of events: those must not wait for a full block. */
function compressed(): express.RequestHandler {
  return compression({
    filter: (req, res) => {
      const type = String(res.getHeader('Content-Type'));
      if (type.startsWith('text/event-stream')) return false;
      return type.startsWith('application/x-ndjson') || compression.filter(req, res);
    },
  });
}
