import { readFileSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import { fileURLToPath } from 'node:url';

/** `npm run bench -- trace [--write]`: measures, prints a table and, with --write, puts it into the README between its markers. */

const README = new URL('../README.md', import.meta.url);

interface Bench {
  readonly bench: () => Promise<string>;
}

const BENCHES: Readonly<Record<string, () => Promise<Bench>>> = {
  trace: () => import('../tests/bench/trace'),
};

/** Puts a table between the markers of a bench; the markers are added to the section on figures when they are not there yet. */
function written(readme: string, name: string, table: string): string {
  const [open, close] = [`<!-- bench ${name} -->`, `<!-- /bench ${name} -->`];
  const block = `${open}\n\n${table}\n\n${close}`;
  const [from, to] = [readme.indexOf(open), readme.indexOf(close)];
  if (from >= 0 && to > from) return readme.slice(0, from) + block + readme.slice(to + close.length);
  return readme.replace('<!-- bench -->', `${block}\n\n<!-- bench -->`);
}

const [name = '', ...options] = process.argv.slice(2);
const load = BENCHES[name];
if (!load) {
  process.stderr.write(`Name a bench: ${Object.keys(BENCHES).join(', ')}\n`);
  process.exitCode = 1;
} else {
  const table = await (await load()).bench();
  const day = new Date().toISOString().slice(0, 10);
  const dated = `Measured ${day} on ${os.availableParallelism()} cores, Node ${process.versions.node}.\n\n${table}`;
  process.stdout.write(`${dated}\n`);
  if (options.includes('--write')) writeFileSync(fileURLToPath(README), written(readFileSync(README, 'utf8'), name, dated));
}
