// npm run bench -- NAME [--write]: measures, prints a table, and with --write puts it into README.md.
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import { pathToFileURL } from 'node:url';

/** A bench answers a markdown table; what is wrong with a run it throws. */
export type Bench = (args: readonly string[]) => Promise<string>;

const names = readdirSync('tests/bench')
  .filter((file) => file.endsWith('.ts'))
  .map((file) => file.replace(/\.ts$/, ''));

const [name = '', ...args] = process.argv.slice(2);
if (!names.includes(name)) {
  console.error(`Name a bench: ${names.join(', ')}.`);
  process.exit(1);
}

const { run } = (await import(pathToFileURL(`tests/bench/${name}.ts`).href)) as { run: Bench };
const table = await run(args.filter((word) => word !== '--write'));
const measured = `Measured on ${new Date().toISOString().slice(0, 10)}, ${os.cpus().length} cores, Node ${process.versions.node}.`;
console.log(`${table}\n\n${measured}`);
if (args.includes('--write')) writeIntoReadme(`${table}\n\n${measured}`);

/** Replaces what stands between the marks of this bench. */
function writeIntoReadme(text: string): void {
  const [open, close] = [`<!-- bench ${name} -->`, `<!-- /bench ${name} -->`];
  const readme = readFileSync('README.md', 'utf8');
  const [from, to] = [readme.indexOf(open), readme.indexOf(close)];
  if (from < 0 || to < from) throw new Error(`README.md has no place marked ${open} … ${close}.`);
  writeFileSync('README.md', `${readme.slice(0, from + open.length)}\n\n${text}\n\n${readme.slice(to)}`);
}
