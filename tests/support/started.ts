import { spawn, type ChildProcess } from 'node:child_process';
import { createServer } from 'node:net';

const START_MS = 40_000;

/** A port that nothing listens on now. */
export const freePort = () =>
  new Promise<number>((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => (address && typeof address === 'object' ? resolve(address.port) : reject(new Error('no port'))));
    });
  });

export interface Started {
  readonly process: ChildProcess;
  /** What it has said so far, on both streams. */
  readonly said: () => string;
  /** Its exit status, once it has ended; null when a signal ended it. */
  readonly ended: Promise<number | null>;
}

/** Where the build lies is no setting of the server that is started. */
const isOurs = (name: string) => name.startsWith('COUPLET_') && name !== 'COUPLET_OUT';

/** Starts the built server with these settings and no others of ours. */
export function startServer(settings: Readonly<Record<string, string>>): Started {
  const others = Object.fromEntries(Object.entries(process.env).filter(([name]) => !isOurs(name)));
  const server = spawn(process.execPath, ['scripts/serve.mjs'], {
    env: { ...others, NODE_ENV: 'production', ...settings },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  for (const stream of [server.stdout, server.stderr]) stream.on('data', (chunk: Buffer) => (output += chunk.toString()));
  const ended = new Promise<number | null>((resolve) => server.once('close', (status) => resolve(status)));
  return { process: server, said: () => output, ended };
}

/** Waits until a started server answers; throws with what it said when it does not. */
export async function untilUp(url: string, { process: server, said }: Started): Promise<void> {
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
