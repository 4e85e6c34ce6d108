import { readdirSync, readFileSync } from 'node:fs';
import { beforeAll, describe, expect, inject, test } from 'vitest';
import { operations, type Operation, type OperationName } from '@/lib/contracts';
import { clientOf, type Client } from '../support/api';

const E = 'engineer';
const L = 'librarian';
const D = 'designer';
const A = 'administrator';
const WHO = [null, E, L, D, A] as const;
type Who = (typeof WHO)[number];

/** Who gets past the door of each call; what one thing asks besides (its owner, its state) is tested where it is done. */
const TABLE: Record<OperationName, readonly Who[]> = {
  health: WHO,
  describe: WHO,
  signIn: WHO,
  signOut: [E, L, D, A],
  me: [E, L, D, A],
  sessions: [E, L, D, A],
  endSession: [E, L, D, A],
  changePassword: [E, L, D, A],
  today: [E, L, D, A],
  vendors: [E, L, D, A],
  vendor: [E, L, D, A],
  createModule: [E, L],
  module: [E, L, D, A],
  updateModule: [E, L],
  sheets: [E, L],
  createSheet: [E, L],
  sheet: [E, L, D, A],
  updateSheet: [E, L],
  addPage: [E, L],
  removePage: [E, L],
  startReading: [E, L],
  picture: [E, L, D, A],
  thumbnail: [E, L, D, A],
  original: [E, L, D, A],
  readings: [E, L],
  reading: [E, L, D, A],
  saveReading: [E, L],
  fitReading: [E, L, D, A],
  handIn: [E, L],
  takeBack: [E, L],
  approve: [L],
  returnReading: [L],
  withdraw: [L],
  restore: [L],
  review: [L],
  evidence: [E, L, D, A],
  mail: [A],
  trail: [A],
  people: [A],
  addPerson: [A],
  changeRoles: [A],
  disablePerson: [A],
  enablePerson: [A],
  catalogue: [E, L, D, A],
  moduleModel: [E, L, D, A],
  duty: [E, L, D],
};

const NOWHERE = '999999';
const base = inject('baseUrl');
const clients = new Map<Who, Client>();
beforeAll(async () => {
  for (const who of WHO) clients.set(who, await clientOf(base, who));
});

const addressOf = (operation: Operation) => operation.path.replace(/\{\w+\}/g, NOWHERE);

const rows = (Object.keys(operations) as OperationName[])
  .filter((name) => name !== 'signOut' && name !== 'signIn')
  .flatMap((name) => WHO.map((who) => ({ name, who: who ?? 'nobody', allowed: TABLE[name]?.includes(who) })));

test.each(rows)('$name, $who: allowed $allowed', async ({ name, who, allowed }) => {
  const operation: Operation = operations[name];
  const client = clients.get(who === 'nobody' ? null : (who as Who));
  const body = operation.body || operation.multipart ? { nonsense: true } : undefined;
  const answer = await client!.call(operation.method, addressOf(operation), body, operation.ifMatch ? { 'If-Match': '"1"' } : {});
  if (allowed) expect([200, 201, 204, 404, 415, 422, 503]).toContain(answer.status);
  else expect(answer.status).toBe(who === 'nobody' ? 401 : 403);
  if (!answer.ok) {
    expect(answer.headers.get('content-type')).toMatch(/^application\/problem\+json/);
    expect(await answer.json()).toMatchObject({ status: answer.status, detail: expect.stringMatching(/\.$/) });
  }
});

describe('the table is whole', () => {
  const files = (readdirSync('src/pages/api', { recursive: true }) as string[]).filter((file) => file.endsWith('.ts'));
  const routeOf = (file: string) =>
    `/api/${file}`
      .replace(/\.ts$/, '')
      .replace(/\/index$/, '')
      .replaceAll('[', '{')
      .replaceAll(']', '}');
  const served = files.flatMap((file) =>
    [...readFileSync(`src/pages/api/${file}`, 'utf8').matchAll(/export const (GET|POST|PUT|DELETE|PATCH|ALL)\b/g)].map(
      (found) => `${found[1]} ${routeOf(file)}`,
    ),
  );

  test('every route under src/pages/api is an operation, and every operation has its route', () => {
    const described = Object.values(operations).map((operation: Operation) => `${operation.method} ${operation.path}`);
    expect(served.sort()).toEqual(described.sort());
  });

  test('every operation stands in the table of who may call it', () => {
    expect(Object.keys(TABLE).sort()).toEqual(Object.keys(operations).sort());
  });
});
