// Runs before every file of the database tests: settings of their own, so that nothing of the project's data is touched.
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll } from 'vitest';

// In memory where there is a place for it: SQLite waits for the disk at every commit.
const MEMORY = '/dev/shm';
const folder = mkdtempSync(path.join(existsSync(MEMORY) ? MEMORY : os.tmpdir(), 'couplet-db-'));
process.env.COUPLET_DATA = folder;
process.env.COUPLET_MAIL ??= 'memory';
process.env.COUPLET_LOG_LEVEL = 'silent';

afterAll(() => rmSync(folder, { recursive: true, force: true }));
