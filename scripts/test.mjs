// Everything that must hold: lint, types, unit, database, API and browser tests. `npm test -- unit` runs one project;
// `npm run test:long` runs the soak and crash tests.
import { bin, build, chromium, install } from './lib.mjs';

const only = process.argv.slice(2).filter((word) => word !== '--long');
const long = process.argv.includes('--long');
const started = Date.now();
install();
chromium();
build();
if (only.length === 0 && !long) {
  bin(['eslint', 'bin', 'eslint.js'], '--max-warnings', '0', '.');
  bin(['prettier', 'bin', 'prettier.cjs'], '--check', '--log-level', 'warn', '.');
  bin(['astro', 'astro.js'], 'check', '--minimumFailingSeverity', 'warning');
}
const projects = only.length > 0 ? only : long ? ['long'] : ['unit', 'db', 'api', 'e2e'];
bin(['vitest', 'vitest.mjs'], 'run', ...projects.flatMap((name) => ['--project', name]));
console.log(`All done in ${Math.round((Date.now() - started) / 1000)} s.`);
