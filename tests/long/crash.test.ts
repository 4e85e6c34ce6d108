import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, expect, test } from 'vitest';
import type { ReadingView, SheetView, UploadAnswer } from '@/lib/contracts';
import { emptyChart } from '@/lib/editor';
import { clientOf } from '../support/api';
import { uniforms } from '../support/random';

const ROUNDS = Number(process.env.CRASH_ROUNDS ?? 40);
const SEED = Number(process.env.CRASH_SEED ?? 20261201);
const LONGEST_LIFE_MS = 600;
const PORT = 4399;
const base = `http://localhost:${PORT}`;
const data = mkdtempSync(path.join(os.tmpdir(), 'couplet-crash-'));
const chart = readFileSync('tests/fixtures/charts/d04.png');

let server: ChildProcess;
afterAll(() => {
  server.kill('SIGKILL');
  rmSync(data, { recursive: true, force: true });
});

async function start(): Promise<void> {
  const env = {
    ...process.env,
    COUPLET_DATA: data,
    COUPLET_PORT: String(PORT),
    COUPLET_LOG_LEVEL: 'error',
    COUPLET_DEMO_DATA: 'people',
    NODE_ENV: 'production',
  };
  server = spawn(process.execPath, ['scripts/serve.mjs'], { env, stdio: ['ignore', 'ignore', 'inherit'] });
  const up = () =>
    fetch(`${base}/api/health`).then(
      (answer) => answer.ok,
      () => false,
    );
  for (let n = 0; n < 400 && !(await up()); n++) await new Promise((resolve) => setTimeout(resolve, 50));
  expect(server.exitCode).toBeNull();
}

const killed = () =>
  new Promise<void>((resolve) => {
    server.once('exit', () => resolve());
    server.kill('SIGKILL');
  });

/** A picture of its own: text after the end of a PNG changes the file, not the pixels. */
const distinct = (n: number) => Buffer.concat([chart, Buffer.from(`round ${n}`)]);

test(`what was answered with 200 is there after each of ${ROUNDS} kills (seed ${SEED})`, async () => {
  const random = uniforms(SEED);
  await start();
  let engineer = await clientOf(base, 'engineer');
  const sheet = (await (await engineer.post('/api/sheets', { vendor: 'Crash Works', title: 'Crashes' })).json()) as SheetView;
  const { page } = (await (await engineer.upload(`/api/sheets/${sheet.id}/pages`, chart, 'd04.png')).json()) as UploadAnswer;
  const identity = {
    vendor: 'Crash Works',
    partNumber: 'Tumble',
    stages: null,
    couples: null,
    coldPlateMm: null,
    hotPlateMm: null,
    heightMm: null,
    maxTemperatureC: null,
    leadsOhm: null,
    sealing: null,
    acResistanceOhm: null,
    acResistanceAtC: null,
    ratings: [],
  };
  const module = (await (await engineer.post('/api/modules', identity)).json()) as { id: number };
  const { id } = (await (await engineer.post(`/api/sheets/${sheet.id}/readings`, { moduleId: module.id })).json()) as { id: number };
  const read = async () => (await (await engineer.get(`/api/readings/${id}`)).json()) as ReadingView;

  const promised = new Map<number, string>();
  let sent = 0;
  let acknowledged = { version: 1, title: '' };
  for (let round = 0; round < ROUNDS; round++) {
    let alive = true;
    const saving = (async () => {
      while (alive) {
        const title = `save ${++sent}`;
        const document = {
          format: 'couplet.bench',
          version: 1,
          charts: [{ ...emptyChart('c1', page.picture), title }],
          model: { form: 'auto', use: ['curves'] },
        };
        const answer = await engineer
          .put(`/api/readings/${id}`, { document }, { 'If-Match': `"${acknowledged.version}"` })
          .catch(() => null);
        if (answer?.status !== 200) return;
        acknowledged = { version: ((await answer.json()) as { version: number }).version, title };
      }
    })();
    const uploading = engineer
      .upload(`/api/sheets/${sheet.id}/pages`, distinct(round), `round-${round}.png`)
      .then(async (answer) => {
        if (answer.status !== 201) return;
        const { picture } = ((await answer.json()) as UploadAnswer).page;
        promised.set(picture.id, picture.fileSha256);
      })
      .catch(() => undefined);
    await new Promise((resolve) => setTimeout(resolve, random() * LONGEST_LIFE_MS));
    await killed();
    alive = false;
    await Promise.all([saving, uploading]);

    await start(); // the boot step checks the file, its settings and its foreign keys
    engineer = await clientOf(base, 'engineer');
    const now = await read();
    expect(now.version).toBeGreaterThanOrEqual(acknowledged.version);
    if (now.version === acknowledged.version && acknowledged.title) expect(now.document.charts[0]?.title).toBe(acknowledged.title);
    else if (now.version > acknowledged.version) expect(now.document.charts[0]?.title).toBe(`save ${sent}`);
    acknowledged = { version: now.version, title: now.document.charts[0]?.title ?? '' };
    for (const picture of promised.keys()) {
      expect((await engineer.get(`/api/pictures/${picture}/original`)).status).toBe(200);
      expect((await engineer.get(`/api/pictures/${picture}`)).status).toBe(200);
    }
  }
  expect(sent).toBeGreaterThan(ROUNDS);
  expect(promised.size).toBeGreaterThan(0);
});
