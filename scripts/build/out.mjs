import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../..', import.meta.url));
const settings = path.join(root, '.env');
if (existsSync(settings)) process.loadEnvFile(settings);

/** Where the build goes and is served from: COUPLET_OUT, seen from the project's folder. */
export const out = path.resolve(root, process.env.COUPLET_OUT || 'dist');
