import { randomBytes, randomInt } from 'node:crypto';
import {
  addTrail,
  createPerson,
  deleteSessionsOf,
  findPerson,
  findPersonByEmail,
  inTransaction,
  listPeople,
  setDisabled,
  setRoles,
  type PersonRecord,
} from '@db';
import type { Role } from '@/lib/access';
import type { AddedPerson, AddPersonBody, Member } from '@/lib/contracts';
import { conflict, notFound, wrongInput } from '../refusal';
import { hashPassword } from './passwords';
import { requireCan } from './require';
import type { SignedInPerson } from './sign-in';

const toMember = ({ id, name, email, roles, disabled, createdAt }: PersonRecord): Member => ({
  id,
  name,
  email,
  roles: [...roles],
  disabled,
  since: createdAt.toISOString(),
});

async function personById(id: string): Promise<PersonRecord> {
  const person = await findPerson(id);
  if (!person) throw notFound('person');
  return person;
}

const memberById = async (id: string): Promise<Member> => toMember(await personById(id));

// Letters and digits that are not taken for one another: 31 of them, so 25 carry 123 bits.
const PLAIN = 'abcdefghjkmnpqrstuvwxyz23456789';
const GROUPS = 5;
const GROUP_LENGTH = 5;

/** A random password for the first sign-in, in groups that can be read out. */
export function randomPassword(): string {
  const group = () => Array.from({ length: GROUP_LENGTH }, () => PLAIN[randomInt(PLAIN.length)]).join('');
  return Array.from({ length: GROUPS }, group).join('-');
}

/** Makes a person inside the running transaction; refuses an address that somebody has. `by` is null for the command. */
export async function makePerson(body: AddPersonBody, passwordHash: string, by: string | null): Promise<string> {
  const there = await findPersonByEmail(body.email);
  if (there) throw wrongInput({ email: `${there.name} already has this address: change their roles instead, or use another address.` });
  const id = randomBytes(10).toString('hex');
  await createPerson({ id, ...body, passwordHash });
  await addTrail({ userId: by, action: 'added person', object: `person/${id}`, detail: { email: body.email, roles: body.roles } });
  return id;
}

/** Everybody with roles and state, by name. */
export async function team(actor: SignedInPerson): Promise<Member[]> {
  requireCan(actor, 'team.manage');
  return (await listPeople()).map(toMember);
}

/** Adds a person with a random password, which this answer tells once. */
export async function addPerson(actor: SignedInPerson, body: AddPersonBody): Promise<AddedPerson> {
  requireCan(actor, 'team.manage');
  const password = randomPassword();
  const passwordHash = await hashPassword(password);
  const id = await inTransaction(() => makePerson(body, passwordHash, actor.id));
  return { person: await memberById(id), password };
}

/** Without an administrator nobody could bring one back. */
async function requireAnotherAdministrator(person: PersonRecord): Promise<void> {
  if (person.disabled || !person.roles.includes('administrator')) return;
  const others = (await listPeople()).filter(({ id, disabled, roles }) => id !== person.id && !disabled && roles.includes('administrator'));
  if (others.length === 0) throw conflict(`${person.name} is the only administrator: make somebody else one first.`, 'last-administrator');
}

/** Replaces a person's roles; they count from that person's next step on. */
export async function changeRoles(actor: SignedInPerson, id: string, roles: readonly Role[]): Promise<Member> {
  requireCan(actor, 'team.manage');
  await inTransaction(async () => {
    const person = await personById(id);
    if (!roles.includes('administrator')) await requireAnotherAdministrator(person);
    await setRoles(id, roles);
    await addTrail({
      userId: actor.id,
      action: 'changed roles',
      object: `person/${id}`,
      detail: { before: person.roles, after: [...roles].sort() },
    });
  });
  return memberById(id);
}

/** Shuts a person out: no sign-in, and every session ends at once. */
export async function disablePerson(actor: SignedInPerson, id: string): Promise<Member> {
  requireCan(actor, 'team.manage');
  await inTransaction(async () => {
    const person = await personById(id);
    await requireAnotherAdministrator(person);
    if (id === actor.id) throw conflict('You cannot disable yourself: ask another administrator to do it.', 'own-person');
    await setDisabled(id, true);
    await deleteSessionsOf(id);
    await addTrail({ userId: actor.id, action: 'disabled person', object: `person/${id}` });
  });
  return memberById(id);
}

/** Lets a person sign in again, with the roles and the password they had. */
export async function enablePerson(actor: SignedInPerson, id: string): Promise<Member> {
  requireCan(actor, 'team.manage');
  await inTransaction(async () => {
    await personById(id);
    await setDisabled(id, false);
    await addTrail({ userId: actor.id, action: 'enabled person', object: `person/${id}` });
  });
  return memberById(id);
}
