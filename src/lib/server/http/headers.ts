import type { MiddlewareHandler } from 'astro';
import { config } from '../config';

const YEAR_S = 31_536_000;

/** Headers of every answer that Astro makes; static files get theirs in scripts/serve.mjs. */
export const headers: MiddlewareHandler = async ({ url, isPrerendered }, next) => {
  const response = await next();
  if (isPrerendered) return response;
  const set = (name: string, value: string) => response.headers.set(name, value);
  set('X-Content-Type-Options', 'nosniff');
  set('Referrer-Policy', 'same-origin');
  set('Cross-Origin-Opener-Policy', 'same-origin');
  set('Cross-Origin-Resource-Policy', 'same-origin');
  set('Permissions-Policy', 'camera=(), microphone=(), geolocation=()');
  if (config().secure) set('Strict-Transport-Security', `max-age=${YEAR_S}; includeSubDomains`);
  if (url.pathname.startsWith('/api/')) {
    set('Content-Security-Policy', "default-src 'none'; frame-ancestors 'none'; sandbox");
    if (!response.headers.has('Cache-Control')) set('Cache-Control', 'no-store');
    return response;
  }
  if (!response.headers.has('Cache-Control')) set('Cache-Control', 'no-store');
  // Astro's own policy cannot name these two
  const policy = response.headers.get('Content-Security-Policy');
  // a rewritten page has passed here once already
  if (policy?.includes('frame-ancestors')) return response;
  const ours = "style-src-attr 'unsafe-inline'; frame-ancestors 'none';";
  set('Content-Security-Policy', policy ? `${policy} ${ours}` : ours);
  return response;
};
