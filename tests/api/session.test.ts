import { expect, inject, test } from 'vitest';
import { client, clientOf, newcomer } from '../support/api';
import { PASSWORD, PEOPLE } from '../support/people';

const base = inject('baseUrl');
const engineer = { email: PEOPLE.engineer, password: PASSWORD };

test('signing in gives a session that ends at sign-out, on the server too', async () => {
  const person = await clientOf(base, 'engineer');
  expect((await person.get('/api/me')).status).toBe(200);
  const cookie = person.cookie();
  expect((await person.del('/api/session')).status).toBe(204);
  const thief = client(base);
  thief.useCookie(cookie);
  expect((await thief.get('/api/me')).status).toBe(401);
});

test('the cookie is HttpOnly, SameSite=Lax, for the whole site, and not Secure on a plain address', async () => {
  const answer = await client(base).post('/api/session', engineer);
  const [line] = answer.headers.getSetCookie();
  expect(line).toMatch(/^couplet=[a-z0-9]{32,};/);
  expect(line).toMatch(/HttpOnly/i);
  expect(line).toMatch(/SameSite=Lax/i);
  expect(line).toMatch(/Path=\//);
  expect(line).not.toMatch(/Secure|Domain/i);
});

test('a cookie that the server did not make is refused and replaced at sign-in', async () => {
  const person = client(base);
  person.useCookie('couplet=aaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaa');
  expect((await person.get('/api/me')).status).toBe(401);
  await person.post('/api/session', engineer);
  expect(person.cookie()).not.toContain('aaaaaaaa');
});

test('signing in again ends the session before', async () => {
  const person = await clientOf(base, 'designer');
  const before = person.cookie();
  await person.post('/api/session', { email: PEOPLE.designer, password: PASSWORD });
  const old = client(base);
  old.useCookie(before);
  expect((await old.get('/api/me')).status).toBe(401);
});

test('a wrong password and an unknown address are answered alike', async () => {
  const wrong = await client(base).post('/api/session', { email: 'nobody-here@kelda.example', password: 'not this one' });
  const unknown = await client(base).post('/api/session', { email: PEOPLE.administrator, password: 'not this one' });
  expect([wrong.status, unknown.status]).toEqual([401, 401]);
  expect(await wrong.json()).toEqual(await unknown.json());
});

test('after five wrong tries an account waits at most a minute, and others do not', async () => {
  const attacker = client(base);
  const email = 'guessed@kelda.example';
  const statuses: number[] = [];
  for (let n = 0; n < 6; n++) statuses.push((await attacker.post('/api/session', { email, password: `guess ${n}` })).status);
  expect(statuses).toEqual([401, 401, 401, 401, 401, 429]);
  const last = await attacker.post('/api/session', { email, password: 'guess' });
  expect(Number(last.headers.get('retry-after'))).toBeLessThanOrEqual(60);
  expect((await attacker.post('/api/session', engineer)).status).toBe(200);
});

test('sessions are listed by handles that sign nobody in, and one can be ended', async () => {
  const one = await clientOf(base, 'both');
  const two = await clientOf(base, 'both');
  const sessions = (await (await two.get('/api/account/sessions')).json()) as { id: string; current: boolean }[];
  expect(sessions.filter((session) => session.current)).toHaveLength(1);
  const other = sessions.find((session) => !session.current)!;
  const thief = client(base);
  thief.useCookie(`couplet=${other.id}`);
  expect((await thief.get('/api/me')).status).toBe(401);
  for (const session of sessions.filter((candidate) => !candidate.current))
    expect((await two.del(`/api/account/sessions/${session.id}`)).status).toBe(204);
  expect((await one.get('/api/me')).status).toBe(401);
  expect((await two.get('/api/me')).status).toBe(200);
});

const gate: readonly { name: string; headers: Record<string, string> }[] = [
  { name: 'from another site', headers: { Origin: 'https://evil.example', 'Sec-Fetch-Site': 'cross-site' } },
  { name: 'from a sibling site', headers: { 'Sec-Fetch-Site': 'same-site' } },
  { name: 'with an origin of another host', headers: { Origin: 'http://localhost:1', 'Sec-Fetch-Site': '' } },
  { name: 'with the origin null', headers: { Origin: 'null', 'Sec-Fetch-Site': '' } },
  { name: 'without any origin', headers: { Origin: '', 'Sec-Fetch-Site': '' } },
];
const stripped = (headers: Record<string, string>) => Object.fromEntries(Object.entries(headers).filter(([, value]) => value !== ''));

test.each(gate)('an unsafe request $name is refused, whatever its body', async ({ headers }) => {
  const person = await clientOf(base, 'engineer');
  for (const type of ['application/json', 'text/plain', 'multipart/form-data; boundary=x', 'APPLICATION/X-WWW-FORM-URLENCODED']) {
    const answer = await fetch(`${base}/api/sheets`, {
      method: 'POST',
      headers: { ...stripped(headers), Cookie: person.cookie(), 'Content-Type': type },
      body: '{}',
    });
    expect(answer.status).toBe(403);
  }
});

test('a body that is not JSON is refused where JSON is meant', async () => {
  const person = await clientOf(base, 'engineer');
  const answer = await person.call('POST', '/api/sheets', undefined, { 'Content-Type': 'text/plain' });
  expect(answer.status).toBe(415);
});

test('forwarded addresses are not believed, so a throttle cannot be walked round', async () => {
  const statuses: number[] = [];
  const person = client(base);
  for (let n = 0; n < 6; n++)
    statuses.push(
      (await person.call('POST', '/api/session', { email: 'walker@kelda.example', password: 'x' }, { 'X-Forwarded-For': `10.0.0.${n}` }))
        .status,
    );
  expect(statuses.at(-1)).toBe(429);
});

test('a new password needs the old one, must not be easy, and ends the other sessions', async () => {
  const person = await newcomer(base, ['designer']);
  const other = client(base);
  await other.post('/api/session', { email: person.email, password: person.password });
  const change = (current: string, next: string) => person.post('/api/account/password', { current, next });
  expect((await change('wrong one', 'three unrelated words')).status).toBe(422);
  expect(await (await change(person.password, 'couplet1234')).json()).toHaveProperty('fields.next');
  expect(await (await change(person.password, 'short')).json()).toHaveProperty('fields.next');
  expect((await change(person.password, 'three unrelated words')).status).toBe(204);
  expect((await other.get('/api/me')).status).toBe(401);
  expect((await person.get('/api/me')).status).toBe(200);
  expect((await client(base).post('/api/session', { email: person.email, password: person.password })).status).toBe(401);
  expect((await client(base).post('/api/session', { email: person.email, password: 'three unrelated words' })).status).toBe(200);
});
