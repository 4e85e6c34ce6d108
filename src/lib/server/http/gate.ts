import type { MiddlewareHandler } from 'astro';
import { config, isLoopback } from '../config';
import { notAllowed } from '../refusal';
import { problemResponse } from './problem';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/** Hosts that people may reach this server by: the public address, and in demo mode any loopback name. */
function isOurs(origin: URL, host: string): boolean {
  const { publicAddress, demo } = config();
  return origin.host === publicAddress.host || (demo && isLoopback(origin.hostname) && origin.host === host);
}

/**
 * A browser says with every unsafe request where it comes from; it must come from our own pages.
 * Sec-Fetch-Site is the first signal and Origin the fallback that older browsers need.
 */
function sameOrigin(request: Request): boolean {
  const site = request.headers.get('sec-fetch-site');
  if (site !== null && site !== 'same-origin') return false;
  const origin = request.headers.get('origin');
  const host = request.headers.get('host');
  if (!origin || !host || !URL.canParse(origin)) return false;
  return isOurs(new URL(origin), host);
}

export const gate: MiddlewareHandler = ({ request }, next) => {
  if (SAFE.has(request.method) || sameOrigin(request)) return next();
  return problemResponse(notAllowed('This request came from another site. Open Couplet itself and try again.'));
};
