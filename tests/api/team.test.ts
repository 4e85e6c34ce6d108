import { beforeAll, expect, inject, test } from 'vitest';
import type { MailItem, Member, Problem, TrailPage } from '@/lib/contracts';
import { client, clientOf, newcomer, type Client } from '../support/api';
import { finishedReading, must, sheetWithChart, take } from '../support/approved';
import { PEOPLE } from '../support/people';

const base = inject('baseUrl');
let administrator: Client;
beforeAll(async () => {
  administrator = await clientOf(base, 'administrator');
});

const team = async () => must<Member[]>(await administrator.get('/api/people'));
const memberOf = async (email: string) => (await team()).find((member) => member.email === email);
const trail = async (query = '') => must<TrailPage>(await administrator.get(`/api/trail${query}`));
const signIn = (person: { email: string; password: string }) =>
  client(base).post('/api/session', { email: person.email, password: person.password });

test('whoever is added signs in with the password that was told, and stands in the team', async () => {
  const person = await newcomer(base, ['designer', 'engineer']);
  expect((await person.get('/api/me')).status).toBe(200);
  expect(await memberOf(person.email)).toMatchObject({ id: person.id, disabled: false, roles: ['designer', 'engineer'] });
});

test.each([
  ['an address that somebody has', { email: PEOPLE.librarian, name: 'Somebody', roles: ['designer'] }, 'email'],
  ['an address that is none', { email: 'wren', name: 'Wren', roles: ['designer'] }, 'email'],
  ['no name', { email: 'nameless@kelda.example', name: ' ', roles: ['designer'] }, 'name'],
  ['no role', { email: 'idle@kelda.example', name: 'Idle', roles: [] }, 'roles'],
])('%s is refused with a sentence for the field', async (_what, body, field) => {
  const answer = await administrator.post('/api/people', body);
  expect(answer.status).toBe(422);
  expect(((await answer.json()) as Problem).fields?.[field]).toMatch(/\.$/);
});

test('changed roles count from the next call on', async () => {
  const person = await newcomer(base, ['designer']);
  expect((await person.get('/api/sheets')).status).toBe(403);
  await must(await administrator.put(`/api/people/${person.id}/roles`, { roles: ['engineer'] }));
  expect((await person.get('/api/sheets')).status).toBe(200);
  expect((await person.post('/api/duty', { heatW: 5, coldFaceC: 10, hotFaceC: 30 })).status).toBe(200);
});

test('who is disabled is shut out at once and in no way signs in, until enabled again', async () => {
  const person = await newcomer(base, ['designer']);
  expect(await must<Member>(await administrator.post(`/api/people/${person.id}/disable`))).toMatchObject({ disabled: true });
  expect((await person.get('/api/me')).status).toBe(401);
  expect((await signIn(person)).status).toBe(401);
  expect(await must<Member>(await administrator.post(`/api/people/${person.id}/enable`))).toMatchObject({ disabled: false });
  expect((await person.get('/api/me')).status).toBe(401);
  expect((await signIn(person)).status).toBe(200);
});

test('the only administrator stays one', async () => {
  const { id } = (await memberOf(PEOPLE.administrator))!;
  for (const answer of [
    await administrator.put(`/api/people/${id}/roles`, { roles: ['designer'] }),
    await administrator.post(`/api/people/${id}/disable`),
  ]) {
    expect(answer.status).toBe(409);
    expect(((await answer.json()) as Problem).detail).toContain('only administrator');
  }
  expect(await memberOf(PEOPLE.administrator)).toMatchObject({ disabled: false, roles: ['administrator'] });
});

test('nobody is found under a number that nobody has', async () => {
  expect((await administrator.post('/api/people/nobody-here/disable')).status).toBe(404);
});

test('a hand-in is mailed to each librarian but its owner, and its return to the engineer with the reason', async () => {
  const [engineer, librarian] = await Promise.all([clientOf(base, 'engineer'), clientOf(base, 'librarian')]);
  const part = { vendor: 'Dotterel Cold', partNumber: 'Dotterel 6' };
  const { readingId } = await finishedReading(engineer, await sheetWithChart(engineer, part.vendor, 'DC-6'), part);
  await must(await take(engineer, readingId, 'hand-in', { note: 'Please look at the second chart.' }));
  const reason = 'The voltage chart lacks its highest curve.';
  await must(await take(librarian, readingId, 'return', { reason }));
  const mails = (await must<MailItem[]>(await administrator.get('/api/mail'))).filter((mail) => mail.subject.includes(part.partNumber));
  const to = (recipient: string) => mails.filter((mail) => mail.recipient === recipient).map((mail) => mail.body);
  for (const told of [PEOPLE.librarian, PEOPLE.both]) expect(to(told)).toEqual([expect.stringContaining('look at the second chart')]);
  expect(to(PEOPLE.engineer)).toEqual([expect.stringContaining(reason)]);
});

test('the trail tells who did what to whom, newest first, and goes on where a page ends', async () => {
  const person = await newcomer(base, ['designer']);
  await must(await administrator.post(`/api/people/${person.id}/disable`));
  const { entries } = await trail();
  expect(entries[0]).toMatchObject({
    by: 'Odd Brenner',
    action: 'disabled person',
    object: `person/${person.id}`,
    objectName: 'New Comer',
  });
  const older = await trail(`?before=${entries[0]!.id}`);
  expect(older.entries[0]).toEqual(entries[1]);
  expect((await trail('?before=1')).entries).toEqual([]);
  expect((await administrator.get('/api/trail?before=soon')).status).toBe(422);
});
