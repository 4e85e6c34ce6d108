import { readdirSync } from 'node:fs';
import { request } from 'node:http';
import { expect, inject, test } from 'vitest';
import { clientOf } from '../support/api';

const base = inject('baseUrl');
const asset = `/_astro/${readdirSync('dist/client/_astro').find((name) => name.endsWith('.css'))}`;

const kinds = [
  { path: '/sign-in', status: 200 },
  { path: '/', status: 303 },
  { path: '/no-such-page', status: 404 },
  { path: '/api/health', status: 200 },
  { path: '/api/me', status: 401 },
  { path: '/api/no-such-call', status: 404 },
  { path: '/favicon.svg', status: 200 },
  { path: asset, status: 200 },
  { path: '/_image?href=/favicon.svg', status: 404 },
  { path: '/_server-islands/x', status: 404 },
  { path: '/_actions/x', status: 404 },
  { path: '//evil.example/x', status: 404 },
];

test.each(kinds)('$path answers $status with its guards on', async ({ path, status }) => {
  const answer = await raw(path);
  expect(answer.status).toBe(status);
  expect(answer.headers['x-content-type-options']).toBe('nosniff');
  expect(String(answer.headers['content-security-policy'])).toContain("frame-ancestors 'none'");
  expect(answer.headers['server'] ?? answer.headers['x-powered-by']).toBeUndefined();
});

test('pages allow scripts only by hash or from this site', async () => {
  const answer = await raw('/sign-in');
  const policy = String(answer.headers['content-security-policy']);
  expect(policy).toContain("default-src 'self'");
  expect(policy).toContain("object-src 'none'");
  expect(policy).toContain("base-uri 'none'");
  const scripts = policy.split(';').find((part) => part.trim().startsWith('script-src'))!;
  expect(scripts).not.toContain('unsafe-inline');
  expect(scripts).not.toContain('unsafe-eval');
});

test('what a person sees is not kept by caches; built files are', async () => {
  const person = await clientOf(base, 'engineer');
  expect((await person.get('/api/me')).headers.get('cache-control')).toBe('no-store');
  expect((await person.get('/')).headers.get('cache-control')).toBe('no-store');
  expect((await raw(asset)).headers['cache-control']).toContain('immutable');
});

test('a static file asked for with If-Match is answered as without', async () => {
  const answer = await raw(asset, { 'If-Match': '"nonsense"' });
  expect(answer.status).toBe(200);
});

test('paths that climb out of the site find nothing', async () => {
  for (const path of ['/../package.json', '/%2e%2e/package.json', '/_astro/..%2f..%2fserver/entry.mjs', '/%252e%252e/package.json'])
    expect([400, 404]).toContain((await raw(path)).status);
});

/** Without fetch's tidying of the path. */
function raw(path: string, headers: Record<string, string> = {}): Promise<{ status: number; headers: Record<string, unknown> }> {
  const { hostname, port } = new URL(base);
  return new Promise((resolve, reject) => {
    const call = request({ hostname, port, path, headers }, (answer) => {
      answer.resume();
      answer.on('end', () => resolve({ status: answer.statusCode ?? 0, headers: answer.headers }));
    });
    call.on('error', reject);
    call.end();
  });
}
