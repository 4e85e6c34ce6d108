import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { addTrail, deleteExpiredSessions, findPersonByEmail } from '@db';
import type { Actor, Role } from '@/lib/access';
import { Refusal } from '../refusal';
import { verifyPassword } from './passwords';
import { lucia } from './sessions';

export interface SignedInPerson extends Actor {
  readonly email: string;
  readonly name: string;
  readonly roles: readonly Role[];
}

// Against guessing: an account waits at most a minute, so an attacker cannot lock its owner out; an address waits longer.
const byAccount = new RateLimiterMemory({ keyPrefix: 'account', points: 5, duration: 60 });
const byAddress = new RateLimiterMemory({ keyPrefix: 'address', points: 60, duration: 600 });
const LONGEST_AGENT = 200;

const wrong = () => new Refusal(401, 'wrong-sign-in', 'The e-mail address or the password is not right. Check both and try again.');

async function takeATry(limiter: RateLimiterMemory, key: string): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const seconds = Math.max(1, Math.ceil(error.msBeforeNext / 1000));
    throw new Refusal(429, 'too-many-tries', `Too many tries. Wait ${seconds}\u00A0s and try again.`, {
      headers: { 'Retry-After': String(seconds) },
    });
  }
}

/** Checks e-mail and password and starts a session, which replaces `previous`. Throttled by account and by address. */
export async function signIn(attempt: {
  readonly email: string;
  readonly password: string;
  readonly address: string;
  readonly agent: string;
  readonly previous: string | null;
}) {
  const account = attempt.email.toLowerCase();
  await takeATry(byAddress, attempt.address);
  await takeATry(byAccount, account);
  const person = await findPersonByEmail(account);
  const right = await verifyPassword(person?.passwordHash ?? null, attempt.password);
  if (!person || person.disabled || !right) {
    await addTrail({ userId: person?.id ?? null, action: 'sign-in refused' });
    throw wrong();
  }
  await Promise.all([byAccount.delete(account), byAddress.reward(attempt.address)]); // only wrong tries count
  if (attempt.previous) await lucia().invalidateSession(attempt.previous);
  await deleteExpiredSessions(new Date());
  const session = await lucia().createSession(person.id, { agent: attempt.agent.slice(0, LONGEST_AGENT) });
  await addTrail({ userId: person.id, action: 'signed in' });
  return {
    cookie: lucia().createSessionCookie(session.id),
    person: { id: person.id, email: person.email, name: person.name, roles: [...person.roles] },
  };
}

/** Ends the session on the server and answers the cookie that forgets it. */
export async function signOut(person: SignedInPerson, sessionId: string) {
  await lucia().invalidateSession(sessionId);
  await addTrail({ userId: person.id, action: 'signed out' });
  return lucia().createBlankSessionCookie();
}
