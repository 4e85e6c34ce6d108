import { Op } from 'sequelize';
import type { Role } from '@/lib/access';
import { Session, User, UserRole } from '../models';

export interface PersonRecord {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly roles: readonly Role[];
  readonly passwordHash: string;
  readonly disabled: boolean;
  readonly createdAt: Date;
}

export interface SessionRecord {
  readonly id: string;
  readonly userId: string;
  readonly expiresAt: Date;
  readonly createdAt: Date;
  readonly agent: string;
}

const withRoles = { include: [{ model: UserRole, as: 'roleRows' }] };

const toPerson = (user: User): PersonRecord => ({
  id: user.id,
  email: user.email,
  name: user.name,
  roles: (user.roleRows ?? []).map((row) => row.role).sort(),
  passwordHash: user.passwordHash,
  disabled: user.disabledAt != null,
  createdAt: user.createdAt,
});

const toSession = ({ id, userId, expiresAt, createdAt, agent }: Session): SessionRecord => ({ id, userId, expiresAt, createdAt, agent });

export async function findPerson(id: string): Promise<PersonRecord | null> {
  const user = await User.findByPk(id, withRoles);
  return user && toPerson(user);
}

export async function findPersonByEmail(email: string): Promise<PersonRecord | null> {
  const user = await User.findOne({ where: { email }, ...withRoles });
  return user && toPerson(user);
}

export async function listPeople(): Promise<PersonRecord[]> {
  return (await User.findAll({ ...withRoles, order: ['name'] })).map(toPerson);
}

export const countPeople = (): Promise<number> => User.count();

export async function peopleWithRole(role: Role): Promise<PersonRecord[]> {
  const people = await listPeople();
  return people.filter((person) => !person.disabled && person.roles.includes(role));
}

export async function createPerson(person: {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly passwordHash: string;
  readonly roles: readonly Role[];
}): Promise<void> {
  const { roles, ...user } = person;
  await User.create(user);
  await UserRole.bulkCreate(roles.map((role) => ({ userId: person.id, role })));
}

export async function setPasswordHash(id: string, passwordHash: string): Promise<void> {
  await User.update({ passwordHash }, { where: { id } });
}

export async function setRoles(userId: string, roles: readonly Role[]): Promise<void> {
  await UserRole.destroy({ where: { userId } });
  await UserRole.bulkCreate(roles.map((role) => ({ userId, role })));
}

export async function setDisabled(id: string, disabled: boolean): Promise<void> {
  await User.update({ disabledAt: disabled ? new Date() : null }, { where: { id } });
}

export async function insertSession(session: { id: string; userId: string; expiresAt: Date; agent: string }): Promise<void> {
  await Session.create(session);
}

export async function findSession(id: string): Promise<{ session: SessionRecord; person: PersonRecord } | null> {
  const session = await Session.findByPk(id);
  const person = session && (await findPerson(session.userId));
  return session && person ? { session: toSession(session), person } : null;
}

export async function sessionsOf(userId: string): Promise<SessionRecord[]> {
  return (await Session.findAll({ where: { userId }, order: [['createdAt', 'DESC']] })).map(toSession);
}

export async function setSessionExpiry(id: string, expiresAt: Date): Promise<void> {
  await Session.update({ expiresAt }, { where: { id } });
}

export async function deleteSession(id: string): Promise<void> {
  await Session.destroy({ where: { id } });
}

/** Ends every session of a person, but for `keep`. */
export async function deleteSessionsOf(userId: string, keep?: string): Promise<void> {
  await Session.destroy({ where: { userId, ...(keep === undefined ? {} : { id: { [Op.ne]: keep } }) } });
}

export async function deleteExpiredSessions(now: Date): Promise<void> {
  await Session.destroy({ where: { expiresAt: { [Op.lte]: now } } });
}
