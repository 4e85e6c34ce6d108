import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import type { Page } from 'playwright-core';
import { launch } from '../support/browser-program';
import { PASSWORD, PEOPLE } from '../support/people';

const RUNS = 5;
const SLOWER = 4;
const PAGES = ['/sign-in', '/', '/sheets', '/catalogue', '/duty?heat=12&cold=2&hot=40', '/modules/4', '/review/3', '/bench/32'];

const freePort = () =>
  new Promise<number>((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => resolve(address && typeof address === 'object' ? address.port : 0));
    });
  });

/** Starts the built server; answers how long it took until it served. */
async function startServer(data: string, port: number) {
  const from = performance.now();
  const env = { ...process.env, COUPLET_DATA: data, COUPLET_PORT: String(port), COUPLET_LOG_LEVEL: 'error', NODE_ENV: 'production' };
  const server = spawn(process.execPath, ['scripts/start.mjs'], { env, stdio: 'ignore' });
  const up = () =>
    fetch(`http://localhost:${port}/api/health`).then(
      (answer) => answer.ok,
      () => false,
    );
  while (!(await up())) await new Promise((resolve) => setTimeout(resolve, 25));
  return {
    seconds: (performance.now() - from) / 1000,
    stop: () => new Promise((resolve) => (server.once('exit', resolve), server.kill('SIGTERM'))),
  };
}

interface Vitals {
  readonly lcp: number;
  readonly cls: number;
  readonly script: number;
}

/** Largest contentful paint, layout shift and script of one load in a fresh cache. */
async function load(page: Page, address: string): Promise<Vitals> {
  const scripts: Promise<number>[] = [];
  const listen = (response: { url: () => string; body: () => Promise<Buffer> }) => {
    if (response.url().endsWith('.js'))
      scripts.push(
        response.body().then(
          (body) => gzipSync(body).length,
          () => 0,
        ),
      );
  };
  page.on('response', listen);
  await page.goto(address, { waitUntil: 'networkidle' });
  await page.waitForTimeout(500);
  page.off('response', listen);
  const vitals = await page.evaluate(
    () =>
      new Promise<{ lcp: number; cls: number }>((resolve) => {
        let lcp = 0;
        let cls = 0;
        new PerformanceObserver((list) => list.getEntries().forEach((entry) => (lcp = entry.startTime))).observe({
          type: 'largest-contentful-paint',
          buffered: true,
        });
        new PerformanceObserver((list) =>
          list.getEntries().forEach((entry) => (cls += (entry as unknown as { value: number }).value)),
        ).observe({ type: 'layout-shift', buffered: true });
        setTimeout(() => resolve({ lcp, cls }), 100);
      }),
  );
  return { ...vitals, script: (await Promise.all(scripts)).reduce((sum, bytes) => sum + bytes, 0) };
}

const median = (values: readonly number[]) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

/** Start of the server and what a person waits for on each page, signed in with two roles, at a fourth of the processor. */
export async function run(): Promise<string> {
  const data = mkdtempSync(path.join(os.tmpdir(), 'couplet-bench-'));
  const port = await freePort();
  const first = await startServer(data, port);
  await first.stop();
  const second = await startServer(data, port);
  const browser = await launch();
  try {
    const base = `http://localhost:${port}`;
    const rows: string[] = [];
    for (const address of PAGES) {
      const loads: Vitals[] = [];
      for (let n = 0; n < RUNS; n++) {
        const context = await browser.newContext({ baseURL: base, viewport: { width: 1440, height: 900 } });
        if (address !== '/sign-in')
          await context.request.post('/api/session', {
            data: { email: PEOPLE.both, password: PASSWORD },
            headers: { Origin: base, 'Sec-Fetch-Site': 'same-origin' },
          });
        const page = await context.newPage();
        await (await context.newCDPSession(page)).send('Emulation.setCPUThrottlingRate', { rate: SLOWER });
        loads.push(await load(page, address));
        await context.close();
      }
      const [lcp, cls, script] = [
        median(loads.map((it) => it.lcp)),
        Math.max(...loads.map((it) => it.cls)),
        median(loads.map((it) => it.script)),
      ];
      rows.push(`| \`${address.split('?')[0]}\` | ${(lcp / 1000).toFixed(2)} | ${cls.toFixed(3)} | ${(script / 1000).toFixed(1)} |`);
    }
    return [
      `Start: the first with the demo's data ${first.seconds.toFixed(1)} s, the second ${second.seconds.toFixed(1)} s until it serves.`,
      `Pages in Chromium with the processor slowed ${SLOWER} times, median of ${RUNS} loads with an empty cache (layout shift: the worst).`,
      '',
      '| page | largest contentful paint s | layout shift | script, gzip kB |',
      '| --- | ---: | ---: | ---: |',
      ...rows,
    ].join('\n');
  } finally {
    await browser.close();
    await second.stop();
    rmSync(data, { recursive: true, force: true });
  }
}
