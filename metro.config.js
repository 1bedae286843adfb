const http = require('node:http');
const { getDefaultConfig } = require('expo/metro-config');
const config = getDefaultConfig(__dirname);
// The web bundle never needs the server, tests or builds.
const esc = (s) => s.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
config.resolver.blockList = [new RegExp(`^${esc(__dirname)}/(server|tests|dist[^/]*|coverage|\\.ringwright)/.*`)];
// In development, send /api to the Express server so that the browser sees one origin.
const target = new URL(process.env.API_URL ?? 'http://127.0.0.1:8480');
const prev = config.server.enhanceMiddleware;
config.server.enhanceMiddleware = (mw, server) => {
  const next0 = prev ? prev(mw, server) : mw;
  return (req, res, next) => {
    if (!req.url?.startsWith('/api/')) return next0(req, res, next);
    const out = http.request(
      {
        host: target.hostname,
        port: target.port,
        path: req.url,
        method: req.method,
        headers: { ...req.headers, host: target.host },
      },
      (r) => {
        res.writeHead(r.statusCode ?? 502, r.headers);
        r.pipe(res);
      },
    );
    out.on('error', (e) => {
      res.statusCode = 502;
      res.end(String(e.message));
    });
    req.pipe(out);
  };
};
module.exports = config;
