import { createServer } from 'node:http';
import { fileURLToPath } from 'node:url';
import compression from 'compression';
import sirv from 'sirv';

/**
 * The production entry. It settles what Astro must not guess: which hosts are ours, what the public
 * address is, and how much a request may carry. Everything else is Astro's handler.
 */

try {
  process.loadEnvFile(fileURLToPath(new URL('.env', import.meta.url)));
} catch {
  // No .env: the defaults of .env.example hold.
}

const port = Number(process.env.PORT ?? 4321);
const host = process.env.HOST || '127.0.0.1';
const origin = new URL(
  process.env.APP_ORIGIN || `http://${host === '0.0.0.0' || host === '::' ? 'localhost' : host}:${port}`,
);
const trustedHops = Number(process.env.TRUST_PROXY_HOPS ?? 0);
/** Largest request body, in bytes. The API refuses earlier, with a problem document of its own. */
const BODY_LIMIT = 1024 * 1024;
/** How long a request may take to come in, in milliseconds. */
const BODY_TIME = 30_000;
/**
 * The addresses that take photos and documents. They read no further than their own limits, which are the same or smaller; a
 * photo that is sent from a bench with a poor network takes minutes. A length need not be given.
 */
const UPLOADS = [
  { path: /^\/api\/v1\/photos\/?$/, limit: 15 * BODY_LIMIT + 64 * 1024, time: 300_000 },
  { path: /^\/procedures\/[^/]+\/flag\/?$/, limit: 64 * BODY_LIMIT, time: 600_000 },
  { path: /^\/(api\/v1\/imports|procedures\/new)\/?$/, limit: 24 * BODY_LIMIT, time: 300_000 },
];
/** What a request may carry, and for how long. */
const boundsOf = ({ method, url = '', headers }) => {
  const upload =
    method === 'POST' &&
    /^multipart\/form-data/i.test(headers['content-type'] ?? '') &&
    UPLOADS.find(({ path }) => path.test(url.split('?')[0]));
  return upload ? { ...upload, upload: true } : { limit: BODY_LIMIT, time: BODY_TIME, upload: false };
};

const { handler } = await import('./dist/server/entry.mjs');

const assets = sirv(fileURLToPath(new URL('dist/client', import.meta.url)), {
  brotli: true,
  gzip: true,
  etag: true,
  setHeaders: (res, path) => {
    res.setHeader('X-Content-Type-Options', 'nosniff');
    res.setHeader(
      'Cache-Control',
      path.startsWith('/_astro/') ? 'public, max-age=31536000, immutable' : 'public, max-age=3600',
    );
  },
});
const compress = compression({ threshold: 1024 });

const knownHosts = new Set(
  process.env.APP_ORIGIN ? [origin.host] : [`localhost:${port}`, `127.0.0.1:${port}`, `[::1]:${port}`, origin.host],
);

const refuse = (res, status, title, detail) => {
  const body = JSON.stringify({ type: 'about:blank', title, status, detail });
  res.writeHead(status, { 'content-type': 'application/problem+json', connection: 'close' });
  res.end(body);
};

/** Forwarded headers are believed only as far as the proxies we were told of; the rest is a client's claim. */
function settleForwarding(req) {
  const chain = String(req.headers['x-forwarded-for'] ?? '')
    .split(',')
    .map((part) => part.trim())
    .filter(Boolean);
  for (const name of Object.keys(req.headers))
    if (name.startsWith('x-forwarded-') || name === 'forwarded') Reflect.deleteProperty(req.headers, name);
  if (trustedHops > 0 && chain.length >= trustedHops) req.headers['x-forwarded-for'] = chain.at(-trustedHops);
  if (process.env.APP_ORIGIN) {
    req.headers['x-forwarded-proto'] = origin.protocol.slice(0, -1);
    req.headers['x-forwarded-host'] = origin.host;
  }
}

const server = createServer((req, res) => {
  if (!knownHosts.has(req.headers.host ?? ''))
    return refuse(res, 421, 'Misdirected request', 'This server does not answer for that host.');
  const { limit, time, upload } = boundsOf(req);
  if (req.headers['transfer-encoding'] && !upload)
    return refuse(res, 411, 'Length required', 'Send the body with a Content-Length.');
  if (Number(req.headers['content-length'] ?? 0) > limit)
    return refuse(
      res,
      413,
      'Too large',
      upload
        ? `What this form may carry is ${Math.floor(limit / BODY_LIMIT)} MB at most. Send smaller files.`
        : 'A request may carry 1 MB at most.',
    );
  // Whoever sends slower than that holds a place that somebody else could use.
  if (req.headers['content-length'] || upload) {
    const late = setTimeout(() => req.complete || req.destroy(), time);
    res.once('close', () => clearTimeout(late));
  }
  settleForwarding(req);
  assets(req, res, () => compress(req, res, () => void handler(req, res)));
});

server.headersTimeout = BODY_TIME;
server.requestTimeout = Math.max(...UPLOADS.map(({ time }) => time));
server.on('error', (error) => {
  console.error(
    error.code === 'EADDRINUSE'
      ? `Port ${port} is taken. Stop what listens there, or set PORT to another number.`
      : `The server could not listen on ${host}:${port}: ${error.message}`,
  );
  process.exit(1);
});
server.listen(port, host, () => {
  console.log(`Matchmark answers at ${origin.origin}`);
});

let closing = false;
const close = () => {
  if (closing) return;
  closing = true;
  server.close(() => process.exit(0));
  server.closeIdleConnections();
  setTimeout(() => process.exit(0), 5000).unref();
};
process.on('SIGTERM', close);
process.on('SIGINT', close);
