const { request } = require('node:http');
const { getDefaultConfig } = require('expo/metro-config');

/** What belongs to the server when the client comes from the bundler: `npm run dev` says where it listens. */
const SERVER_PATHS = /^\/(api|schemas|fonts|outbox|outbox\.json|readyz|healthz|metrics)([/?]|$)/;

const config = getDefaultConfig(__dirname);

/** One origin for both, so that the session's cookie works as it does in production. */
config.server.enhanceMiddleware = (bundler) => (req, res, next) => {
  const port = process.env.SERVER_PORT;
  if (!port || !SERVER_PATHS.test(req.url)) return bundler(req, res, next);
  const { method, url, headers } = req;
  const forward = request({ host: '127.0.0.1', port, method, path: url, headers }, (answer) => {
    res.writeHead(answer.statusCode, answer.headers);
    answer.pipe(res);
  });
  forward.on('error', () => res.writeHead(502).end('The server does not answer; see .data/web.log'));
  return req.pipe(forward);
};

module.exports = config;
