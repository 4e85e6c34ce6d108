import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { client } from '../support/api';
import { PASSWORD, PEOPLE } from '../support/people';
import { freePort, startServer, untilUp, type Started } from '../support/started';

let data: string;
let running: Started[] = [];
beforeEach(() => {
  data = mkdtempSync(path.join(os.tmpdir(), 'couplet-start-'));
});
afterEach(async () => {
  for (const server of running) if (server.process.exitCode === null) server.process.kill('SIGKILL');
  await Promise.all(running.map((server) => server.ended));
  running = [];
  rmSync(data, { recursive: true, force: true });
});

async function begin(settings: Readonly<Record<string, string>>) {
  const port = String(await freePort());
  const server = startServer({
    COUPLET_PORT: port,
    COUPLET_DATA: data,
    COUPLET_LOG_LEVEL: 'error',
    COUPLET_DEMO_DATA: 'people',
    ...settings,
  });
  running.push(server);
  return { server, base: `http://localhost:${port}` };
}

/** Starts a server that comes up. */
async function start(settings: Readonly<Record<string, string>>) {
  const begun = await begin(settings);
  await untilUp(begun.base, begun.server);
  return begun;
}

/** Starts a server that will not come up: its exit status and what it said. */
async function refusedStart(settings: Readonly<Record<string, string>>) {
  const { server } = await begin(settings);
  const status = await server.ended;
  expect(server.said()).not.toMatch(/\bat .*\.m?js:\d+/);
  return { status, said: server.said() };
}

const signIn = (base: string, who: keyof typeof PEOPLE) => client(base).post('/api/session', { email: PEOPLE[who], password: PASSWORD });

test('a start in demo mode tells its address and who may sign in, and they do', async () => {
  const { server, base } = await start({});
  expect(server.said()).toContain(`Couplet is at ${base}`);
  for (const who of Object.keys(PEOPLE) as (keyof typeof PEOPLE)[]) {
    expect(server.said()).toContain(PEOPLE[who]);
    expect((await signIn(base, who)).status).toBe(200);
  }
});

test('a start without the demo on an empty folder says how to make the first administrator, and nobody signs in', async () => {
  const { server, base } = await start({ COUPLET_DEMO: 'off' });
  expect(server.said()).toMatch(/first administrator.*\n.*npm run person -- --email .* --roles administrator/);
  expect(server.said()).not.toContain(PASSWORD);
  for (const who of ['engineer', 'administrator'] as const) expect((await signIn(base, who)).status).toBe(401);
});

test('a database with demo people is not served without the demo, and is served with it again', async () => {
  const demo = await start({});
  demo.server.process.kill('SIGTERM');
  await demo.server.ended;
  const { status, said } = await refusedStart({ COUPLET_DEMO: 'off' });
  expect(status).toBe(1);
  expect(said).toMatch(/holds demo people.*COUPLET_DATA.*\.$/m);
  const { base } = await start({});
  expect((await signIn(base, 'engineer')).status).toBe(200);
});

test('wrong settings stop the start with a list of them', async () => {
  const { status, said } = await refusedStart({ COUPLET_PORT: 'many', COUPLET_MAIL: 'pigeon', COUPLET_SESSION_HOURS: '0' });
  expect(status).toBe(1);
  for (const name of ['COUPLET_PORT', 'COUPLET_MAIL', 'COUPLET_SESSION_HOURS']) expect(said).toMatch(new RegExp(`^- ${name} must be`, 'm'));
});

test('demo mode is not served to other machines', async () => {
  const { status, said } = await refusedStart({ COUPLET_HOST: '0.0.0.0', COUPLET_PUBLIC_ADDRESS: 'https://couplet.kelda.example' });
  expect(status).toBe(1);
  for (const name of ['COUPLET_HOST', 'COUPLET_PUBLIC_ADDRESS']) expect(said).toMatch(new RegExp(`^- ${name} is .*COUPLET_DEMO=off`, 'm'));
});

test('a port that is taken is named', async () => {
  const { base } = await start({});
  const { status, said } = await refusedStart({ COUPLET_PORT: new URL(base).port });
  expect(status).toBe(1);
  expect(said).toContain(`Port ${new URL(base).port} is taken.`);
});

test.each(['SIGTERM', 'SIGINT'] as const)('%s ends the server well', async (signal) => {
  const { server, base } = await start({});
  expect((await signIn(base, 'engineer')).status).toBe(200);
  server.process.kill(signal);
  expect(await server.ended).toBe(0);
  await expect(fetch(`${base}/api/health`)).rejects.toThrow();
});
