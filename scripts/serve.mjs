// Astro's handler behind a plain http server, so that headers and static files are settled before Astro reads a request.
import http from 'node:http';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { out } from './build/out.mjs'; // reads .env too
import { serveStatic } from './static.mjs';

process.env.ASTRO_NODE_AUTOSTART = 'disabled';
const load = (file) => import(pathToFileURL(path.join(out, 'server', file)).href);

let report;
try {
  const { boot } = await load('node/boot.mjs');
  report = await boot();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
}
const { handler } = await load('entry.mjs');
const staticFile = serveStatic(path.join(out, 'client'));

// Astro routes this site does not use, each with an advisory that Astro 5 will not see fixed.
const UNUSED = /^\/+(_image|_server-islands|_actions)(\/|\?|$)/i;
const MAX_BODY_HEADERS_MS = 60_000;

function settleHeaders(request) {
  const { headers } = request;
  if (!report.trustProxy) for (const name of Object.keys(headers)) if (name.startsWith('x-forwarded-')) delete headers[name];
  if (!request.url.startsWith('/api/')) {
    delete headers['if-match'];
    delete headers['if-unmodified-since'];
  }
}

const end = (response, status) =>
  response
    .writeHead(status, {
      'X-Content-Type-Options': 'nosniff',
      'Cache-Control': 'no-store',
      'Content-Security-Policy': "default-src 'none'; frame-ancestors 'none'",
    })
    .end();

const server = http.createServer((request, response) => {
  let pathname;
  try {
    pathname = decodeURIComponent(new URL(request.url ?? '/', 'http://localhost').pathname);
  } catch {
    return end(response, 400);
  }
  if (UNUSED.test(pathname) || request.method === 'TRACE' || (request.url ?? '').startsWith('//')) return end(response, 404);
  settleHeaders(request);
  if (staticFile(request, response, pathname, report.secure)) return undefined;
  return handler(request, response);
});
server.requestTimeout = 120_000;
server.headersTimeout = MAX_BODY_HEADERS_MS;

server.on('error', (error) => {
  console.error(
    error.code === 'EADDRINUSE' ? `Port ${report.port} is taken. Stop what listens there, or set COUPLET_PORT.` : error.message,
  );
  process.exit(1);
});
server.listen(report.port, report.host, () => {
  console.log(`Couplet is at ${report.address}`);
  for (const line of report.lines) console.log(line);
});

let stopping = false;
function stop(code) {
  if (stopping) return;
  stopping = true;
  server.close(() => process.exit(code));
  server.closeIdleConnections();
  setTimeout(() => {
    server.closeAllConnections();
    process.exit(code);
  }, 8000).unref();
}
process.on('SIGINT', () => stop(0));
process.on('SIGTERM', () => stop(0));
for (const event of ['uncaughtException', 'unhandledRejection'])
  process.on(event, (error) => {
    console.error(`Stopping after an error nobody caught:`, error);
    stop(1);
  });
