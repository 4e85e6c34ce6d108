import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import type { TestProject } from 'vitest/node';

declare module 'vitest' {
  interface ProvidedContext {
    baseUrl: string;
    dataFolder: string;
  }
}

const START_MS = 40_000;

const freePort = () =>
  new Promise<number>((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => (address && typeof address === 'object' ? resolve(address.port) : reject(new Error('no port'))));
    });
  });

async function untilUp(url: string, server: ChildProcess, said: () => string): Promise<void> {
  const deadline = Date.now() + START_MS;
  while (Date.now() < deadline) {
    if (server.exitCode !== null) throw new Error(`The server stopped at its start:\n${said()}`);
    const up = await fetch(`${url}/api/health`).then(
      (answer) => answer.ok,
      () => false,
    );
    if (up) return;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`The server did not come up:\n${said()}`);
}

/** Runs the built server on a port and a data folder of its own for all tests of a project. */
export default async function setup(project: TestProject) {
  const data = mkdtempSync(path.join(os.tmpdir(), 'couplet-test-'));
  const port = await freePort();
  const baseUrl = `http://localhost:${port}`;
  let output = '';
  const server = spawn(process.execPath, ['scripts/serve.mjs'], {
    env: {
      ...process.env,
      NODE_ENV: 'production',
      COUPLET_PORT: String(port),
      COUPLET_DATA: data,
      COUPLET_LOG_LEVEL: 'error',
      COUPLET_DEMO_DATA: 'people',
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  for (const stream of [server.stdout, server.stderr]) stream.on('data', (chunk: Buffer) => (output += chunk.toString()));
  await untilUp(baseUrl, server, () => output);
  project.provide('baseUrl', baseUrl);
  project.provide('dataFolder', data);
  return async () => {
    const gone = new Promise((resolve) => server.once('exit', resolve));
    server.kill('SIGTERM');
    await gone;
    rmSync(data, { recursive: true, force: true });
  };
}
