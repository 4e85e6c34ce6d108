import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { TestProject } from 'vitest/node';
import { freePort, startServer, untilUp } from './started';

declare module 'vitest' {
  interface ProvidedContext {
    baseUrl: string;
    dataFolder: string;
  }
}

/** Runs the built server on a port and a data folder of its own for all tests of a project. */
export default async function setup(project: TestProject) {
  const data = mkdtempSync(path.join(os.tmpdir(), 'couplet-test-'));
  const port = await freePort();
  const baseUrl = `http://localhost:${port}`;
  const server = startServer({
    COUPLET_PORT: String(port),
    COUPLET_DATA: data,
    COUPLET_LOG_LEVEL: 'error',
    COUPLET_DEMO_DATA: 'people',
  });
  await untilUp(baseUrl, server);
  project.provide('baseUrl', baseUrl);
  project.provide('dataFolder', data);
  return async () => {
    server.process.kill('SIGTERM');
    await server.ended;
    rmSync(data, { recursive: true, force: true });
  };
}
