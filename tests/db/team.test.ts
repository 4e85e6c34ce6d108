import { expect, test } from 'vitest';
import { countPeople, findPersonByEmail, insertSession, listTrail, sessionsOf, addTrail } from '@db';
import { ROLES, type Role } from '@/lib/access';
import { addPersonBody } from '@/lib/contracts';
import {
  addPerson,
  changeRoles,
  disablePerson,
  enablePerson,
  randomPassword,
  signIn,
  team,
  type SignedInPerson,
} from '@/lib/server/people';
import { Refusal } from '@/lib/server/refusal';
import { trail } from '@/lib/server/trail';
import { person, useDatabase } from '../support/database';

useDatabase();

const administrator = () => person(['administrator'], 'Odd Brenner');
const attempt = (email: string, password: string) => ({ email, password, address: '127.0.0.1', agent: 'test', previous: null });
const inAnHour = () => new Date(Date.now() + 3_600_000);
const entries = async (by: SignedInPerson) =>
  (await trail(by)).entries.map(({ action, objectName, detail }) => [action, objectName, detail]);

test('a person who was added signs in with the password that was told once, and it is nowhere else', async () => {
  const by = await administrator();
  const { person: added, password } = await addPerson(by, { email: 'wren@kelda.example', name: 'Wren Hollis', roles: ['designer'] });
  expect(added).toMatchObject({ name: 'Wren Hollis', email: 'wren@kelda.example', roles: ['designer'], disabled: false });
  expect((await signIn(attempt('WREN@kelda.example', password))).person.id).toBe(added.id);
  expect((await findPersonByEmail('wren@kelda.example'))?.passwordHash).toMatch(/^\$argon2id\$/);
  expect(JSON.stringify([await listTrail(10), await team(by)])).not.toContain(password);
});

test('random passwords are long, easy to read out and never the same', () => {
  const many = Array.from({ length: 200 }, randomPassword);
  expect(new Set(many).size).toBe(200);
  for (const password of many) expect(password).toMatch(/^([a-hjkmnp-z2-9]{5}-){4}[a-hjkmnp-z2-9]{5}$/);
  expect(new Set(many.join('').replaceAll('-', '')).size).toBe(31);
});

test('an address is used once, whatever its case', async () => {
  const by = await administrator();
  const body = { email: 'wren@kelda.example', name: 'Wren Hollis', roles: ['designer'] as Role[] };
  await addPerson(by, body);
  await expect(addPerson(by, { ...body, name: 'Another' })).rejects.toMatchObject({
    status: 422,
    extra: { fields: { email: expect.stringContaining('Wren Hollis') } },
  });
  expect(addPersonBody.parse({ ...body, email: '  Wren@Kelda.Example ' }).email).toBe('wren@kelda.example');
  expect(await countPeople()).toBe(2);
});

test.each([
  [{ email: 'wren', name: 'Wren', roles: ['designer'] }, 'Enter an e-mail address, like name@example.org.'],
  [{ email: 'wren@kelda.example', name: ' ', roles: ['designer'] }, 'Enter the name as others should see it.'],
  [{ email: 'wren@kelda.example', name: 'Wren', roles: [] }, 'Choose at least one role.'],
  [{ email: 'wren@kelda.example', name: 'Wren', roles: ['designer', 'designer'] }, 'Name each role once.'],
])('%j is refused with a sentence', (body, sentence) => {
  expect(addPersonBody.safeParse(body).error?.issues[0]?.message).toBe(sentence);
});

test('disabling ends every session of a person and lets nobody sign in; enabling brings back the same roles', async () => {
  const by = await administrator();
  const { person: wren, password } = await addPerson(by, {
    email: 'wren@kelda.example',
    name: 'Wren Hollis',
    roles: ['designer', 'engineer'],
  });
  await insertSession({ id: 'one', userId: wren.id, expiresAt: inAnHour(), agent: '' });
  await insertSession({ id: 'two', userId: wren.id, expiresAt: inAnHour(), agent: '' });
  await insertSession({ id: 'other', userId: by.id, expiresAt: inAnHour(), agent: '' });
  expect(await disablePerson(by, wren.id)).toMatchObject({ disabled: true });
  expect(await sessionsOf(wren.id)).toEqual([]);
  expect(await sessionsOf(by.id)).toHaveLength(1);
  await expect(signIn(attempt(wren.email, password))).rejects.toMatchObject({ status: 401 });
  expect(await enablePerson(by, wren.id)).toMatchObject({ disabled: false, roles: ['designer', 'engineer'] });
  expect((await signIn(attempt(wren.email, password))).person.name).toBe('Wren Hollis');
});

test('new roles replace the old ones', async () => {
  const by = await administrator();
  const wren = await person(['designer']);
  expect((await changeRoles(by, wren.id, ['librarian', 'engineer'])).roles).toEqual(['engineer', 'librarian']);
});

test('the last administrator is neither stripped nor disabled', async () => {
  const by = await administrator();
  await expect(changeRoles(by, by.id, ['designer'])).rejects.toMatchObject({ status: 409, kind: 'last-administrator' });
  await expect(disablePerson(by, by.id)).rejects.toMatchObject({ status: 409 });
  const second = await person(['administrator', 'designer']);
  await disablePerson(by, second.id);
  await expect(changeRoles(by, by.id, ['designer'])).rejects.toMatchObject({ kind: 'last-administrator' });
  await enablePerson(by, second.id);
  expect((await changeRoles(by, by.id, ['designer'])).roles).toEqual(['designer']);
});

test('of two administrators who shut each other out at once one stays', async () => {
  const first = await administrator();
  const second = await person(['administrator']);
  await Promise.allSettled([disablePerson(first, second.id), disablePerson(second, first.id)]);
  const left = (await team(first)).filter((member) => !member.disabled && member.roles.includes('administrator'));
  expect(left).toHaveLength(1);
});

test('nobody disables themselves', async () => {
  const by = await administrator();
  await person(['administrator']);
  await expect(disablePerson(by, by.id)).rejects.toMatchObject({ kind: 'own-person' });
});

test('what is done to a person stands in the trail by name', async () => {
  const by = await administrator();
  const { person: wren } = await addPerson(by, { email: 'wren@kelda.example', name: 'Wren Hollis', roles: ['designer'] });
  await changeRoles(by, wren.id, ['engineer']);
  await disablePerson(by, wren.id);
  await enablePerson(by, wren.id);
  expect(await entries(by)).toEqual([
    ['enabled person', 'Wren Hollis', {}],
    ['disabled person', 'Wren Hollis', {}],
    ['changed roles', 'Wren Hollis', { before: ['designer'], after: ['engineer'] }],
    ['added person', 'Wren Hollis', { email: 'wren@kelda.example', roles: ['designer'] }],
  ]);
});

test('the trail comes in pages, newest first, without a gap or a repeat', async () => {
  const by = await administrator();
  for (let n = 1; n <= 230; n++) await addTrail({ userId: null, action: `step ${n}` });
  const seen: string[] = [];
  let before: number | null | undefined;
  do {
    const page = await trail(by, before ?? undefined);
    seen.push(...page.entries.map((entry) => entry.action));
    before = page.before;
  } while (before !== null);
  expect(seen).toEqual(Array.from({ length: 230 }, (_, at) => `step ${230 - at}`));
});

test.each(ROLES.filter((role) => role !== 'administrator'))('%s manages no team and sees no trail', async (role) => {
  const by = await person([role]);
  const refused = [
    team(by),
    trail(by),
    changeRoles(by, by.id, ['administrator']),
    disablePerson(by, by.id),
    enablePerson(by, by.id),
    addPerson(by, { email: 'a@b.example', name: 'A', roles: ['administrator'] }),
  ];
  for (const outcome of await Promise.allSettled(refused)) {
    expect(outcome).toMatchObject({ status: 'rejected', reason: expect.any(Refusal) });
    expect((outcome as PromiseRejectedResult).reason).toMatchObject({ status: 403 });
  }
});
