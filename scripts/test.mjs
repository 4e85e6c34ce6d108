// Everything that must hold: lint, types, unit, database, API and browser tests. `npm test -- unit` runs one project;
// `npm run test:long` runs the soak and crash tests.
import { build, chromium, install, together } from './lib.mjs';

const only = process.argv.slice(2).filter((word) => word !== '--long');
const long = process.argv.includes('--long');
const started = Date.now();
const vitest = (projects, ...more) => ['vitest/vitest.mjs', 'run', ...projects.flatMap((name) => ['--project', name]), ...more];

install();
chromium();
build();
if (only.length > 0 || long) {
  await together(vitest(long ? ['long'] : only));
} else {
  await together(
    ['eslint/bin/eslint.js', '--max-warnings', '0', '.'],
    ['astro/astro.js', 'check', '--minimumFailingSeverity', 'warning'],
    ['prettier/bin/prettier.cjs', '--check', '--log-level', 'warn', '.'],
  );
  await together(vitest(['unit']), vitest(['db', 'api']));
  // each half has a server and a browser of its own
  const browser = Date.now();
  await together(vitest(['e2e'], '--shard=1/2'), vitest(['e2e'], '--shard=2/2'));
  console.log(`Browser tests done in ${Math.round((Date.now() - browser) / 1000)} s.`);
}
console.log(`All done in ${Math.round((Date.now() - started) / 1000)} s.`);
