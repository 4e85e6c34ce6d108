import { createReadStream, readdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { createBrotliCompress, createGzip } from 'node:zlib';

const TYPES = {
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.woff2': 'font/woff2',
  '.woff': 'font/woff',
  '.png': 'image/png',
  '.txt': 'text/plain; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
};
const PACKED = new Set(['.js', '.css', '.svg', '.json', '.txt']);
const YEAR = 'public, max-age=31536000, immutable';

function list(folder, under = '') {
  return readdirSync(path.join(folder, under), { withFileTypes: true }).flatMap((entry) => {
    const name = `${under}/${entry.name}`;
    return entry.isDirectory() ? list(folder, name) : [name];
  });
}

/**
 * Answers the built site's own files and nothing else: the list is read once, so no request path ever reaches the
 * file system. Files with a hash in their name are kept for a year.
 */
export function serveStatic(folder) {
  const files = new Map(
    list(folder).map((name) => [name, { file: path.join(folder, name), size: statSync(path.join(folder, name)).size }]),
  );
  return (request, response, pathname, secure) => {
    const found = files.get(pathname);
    if (!found || (request.method !== 'GET' && request.method !== 'HEAD')) return false;
    const ext = path.extname(pathname);
    const headers = {
      'Content-Type': TYPES[ext] ?? 'application/octet-stream',
      'Cache-Control': pathname.startsWith('/_astro/') ? YEAR : 'public, max-age=3600',
      'X-Content-Type-Options': 'nosniff',
      'Referrer-Policy': 'same-origin',
      'Cross-Origin-Resource-Policy': 'same-origin',
      'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'",
      ...(secure ? { 'Strict-Transport-Security': 'max-age=31536000; includeSubDomains' } : {}),
      ...(PACKED.has(ext) ? { Vary: 'Accept-Encoding' } : {}),
    };
    send(request, response, found, headers, PACKED.has(ext));
    return true;
  };
}

function send(request, response, found, headers, packable) {
  const accepts = String(request.headers['accept-encoding'] ?? '');
  const packer =
    packable && (accepts.includes('br') ? ['br', createBrotliCompress] : accepts.includes('gzip') ? ['gzip', createGzip] : null);
  response.writeHead(200, { ...headers, ...(packer ? { 'Content-Encoding': packer[0] } : { 'Content-Length': found.size }) });
  if (request.method === 'HEAD') return response.end();
  const stream = createReadStream(found.file);
  stream.on('error', () => response.destroy());
  return packer ? stream.pipe(packer[1]()).pipe(response) : stream.pipe(response);
}
