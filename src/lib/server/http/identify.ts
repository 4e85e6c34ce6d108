import type { MiddlewareHandler } from 'astro';
import { ensureDatabase } from '@db';
import { config } from '../config';
import { keepMailGoing } from '../mail';
import { lucia, sessionOf } from '../people';

/** Set by the page itself when somebody chooses; absent means what the device says. */
const THEME_COOKIE = 'theme';

/** Fills in who asks: the person and session behind the cookie, or nobody. */
export const identify: MiddlewareHandler = async (context, next) => {
  const { cookies, locals } = context;
  ensureDatabase(config().databaseFile);
  keepMailGoing();
  locals.actor = null;
  locals.session = null;
  const theme = cookies.get(THEME_COOKIE)?.value;
  locals.theme = theme === 'light' || theme === 'dark' ? theme : null;
  const value = cookies.get(lucia().sessionCookieName)?.value;
  const found = value ? await sessionOf(value) : null;
  if (found) {
    locals.actor = found.person;
    locals.session = { id: found.session.id, fresh: found.session.fresh };
  }
  if (value && (!found || found.session.fresh)) {
    const cookie = found ? lucia().createSessionCookie(found.session.id) : lucia().createBlankSessionCookie();
    cookies.set(cookie.name, cookie.value, cookie.attributes);
  }
  return next();
};
