import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

/** `npm run bench -- fit [more]`: runs `tests/bench/<name>.ts` and prints the table of Markdown it returns. */

const [name = '', ...args] = process.argv.slice(2);
const file = new URL(`../tests/bench/${name}.ts`, import.meta.url);

if (!/^[a-z][a-z-]*$/.test(name) || !existsSync(fileURLToPath(file))) {
  process.stderr.write('Name what to measure, for instance: npm run bench -- fit\n');
  process.exitCode = 1;
} else {
  const { run } = (await import(file.href)) as { run: (args: string[]) => Promise<string> };
  process.stdout.write(`${await run(args)}\n`);
}
