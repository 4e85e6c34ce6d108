import type { AstroGlobal } from 'astro';
import { can, type Action } from '@/lib/access';
import type { SignedInPerson } from '../people';
import { Refusal } from '../refusal';

/**
 * Who looks at a page, or the answer to give instead: the sign-in page (which comes back here), or the
 * "not allowed" page. Every page but the open ones begins with it.
 */
export async function requirePage(astro: AstroGlobal, may: Action): Promise<SignedInPerson | Response> {
  const { actor } = astro.locals;
  if (!actor) {
    const back = `${astro.url.pathname}${astro.url.search}`;
    return astro.redirect(`/sign-in?next=${encodeURIComponent(back)}`, 303);
  }
  return can(actor, may) ? actor : astro.rewrite('/refused');
}

/** Runs a use case for a page: what it refuses becomes a page that says so. */
export async function orPage<T>(astro: AstroGlobal, work: () => Promise<T>): Promise<T | Response> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return astro.rewrite(error.status === 404 ? '/404' : '/refused');
  }
}
