import { createHash } from 'node:crypto';
import { Lucia, TimeSpan, type Adapter, type DatabaseSession, type DatabaseUser } from 'lucia';
import {
  deleteExpiredSessions,
  deleteSession,
  deleteSessionsOf,
  findSession,
  insertSession,
  sessionsOf,
  setSessionExpiry,
  type PersonRecord,
} from '@db';
import type { Role } from '@/lib/access';
import type { SessionInfo } from '@/lib/contracts';
import { config } from '../config';

const HOUR_MS = 3_600_000;
const HANDLE_LENGTH = 16;

/** The table holds only this: whoever reads it cannot sign in with it. */
const stored = (id: string) => createHash('sha256').update(id).digest('hex');
const endOfDay = (createdAt: Date) => createdAt.getTime() + config().sessionHours * HOUR_MS;
const toUser = (person: PersonRecord): DatabaseUser => ({
  id: person.id,
  attributes: { email: person.email, name: person.name, roles: person.roles },
});

const adapter: Adapter = {
  async getSessionAndUser(id) {
    const found = await findSession(stored(id));
    if (!found || found.person.disabled || Date.now() >= endOfDay(found.session.createdAt)) return [null, null];
    const session: DatabaseSession = { id, userId: found.session.userId, expiresAt: found.session.expiresAt, attributes: {} };
    return [session, toUser(found.person)];
  },
  async getUserSessions(userId) {
    return (await sessionsOf(userId)).map((session) => ({ ...session, attributes: {} }));
  },
  async setSession(session) {
    const agent = (session.attributes as { agent?: string }).agent ?? '';
    await insertSession({ id: stored(session.id), userId: session.userId, expiresAt: session.expiresAt, agent });
  },
  async updateSessionExpiration(id, expiresAt) {
    const found = await findSession(stored(id));
    if (found) await setSessionExpiry(stored(id), new Date(Math.min(expiresAt.getTime(), endOfDay(found.session.createdAt))));
  },
  deleteSession: (id) => deleteSession(stored(id)),
  deleteUserSessions: (userId) => deleteSessionsOf(userId),
  deleteExpiredSessions: () => deleteExpiredSessions(new Date()),
};

const makeLucia = () =>
  new Lucia(adapter, {
    // lucia renews at half time, so an idle session lives between half of this and all of it
    sessionExpiresIn: new TimeSpan(config().sessionIdleMinutes, 'm'),
    sessionCookie: {
      name: config().secure ? '__Host-couplet' : 'couplet',
      attributes: { secure: config().secure, sameSite: 'lax', path: '/' },
    },
    getUserAttributes: (person) => person,
  });

let held: ReturnType<typeof makeLucia> | undefined;
export const lucia = () => (held ??= makeLucia());

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof makeLucia>;
    DatabaseUserAttributes: { email: string; name: string; roles: readonly Role[] };
    DatabaseSessionAttributes: { agent?: string };
  }
}

export interface LiveSession {
  readonly id: string;
  readonly fresh: boolean;
}

/** Who a cookie's value belongs to; null when it is unknown, expired or ended. */
export async function sessionOf(id: string) {
  const { session, user } = await lucia().validateSession(id);
  return session ? { session, person: { id: user.id, email: user.email, name: user.name, roles: user.roles } } : null;
}

/** A person's sessions, the newest first, with handles that sign nobody in. */
export async function listSessions(userId: string, currentId: string): Promise<SessionInfo[]> {
  const now = Date.now();
  const live = (await sessionsOf(userId)).filter((session) => Math.min(session.expiresAt.getTime(), endOfDay(session.createdAt)) > now);
  return live.map((session) => ({
    id: session.id.slice(0, HANDLE_LENGTH),
    startedAt: session.createdAt.toISOString(),
    expiresAt: new Date(Math.min(session.expiresAt.getTime(), endOfDay(session.createdAt))).toISOString(),
    agent: session.agent,
    current: session.id === stored(currentId),
  }));
}

/** Ends one of a person's own sessions by its handle; false when there is none. */
export async function endSession(userId: string, handle: string): Promise<boolean> {
  const session = (await sessionsOf(userId)).find((candidate) => candidate.id.slice(0, HANDLE_LENGTH) === handle);
  if (session) await deleteSession(session.id);
  return session !== undefined;
}

/** Ends all sessions of a person but the running one. */
export const endOtherSessions = (userId: string, currentId: string) => deleteSessionsOf(userId, stored(currentId));
