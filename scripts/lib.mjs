// Node built-ins only: this runs before anything is installed.
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { out } from './build/out.mjs'; // reads .env too

export const root = fileURLToPath(new URL('..', import.meta.url));
process.chdir(root);
process.env.ASTRO_TELEMETRY_DISABLED ??= '1';

export function sh(command, args, options = {}) {
  const run = spawnSync(command, args, { stdio: 'inherit', ...options });
  if (run.error) throw run.error;
  if (run.status !== 0) {
    console.error(`\n${command} ${args.join(' ')} failed (${run.status ?? run.signal}).`);
    process.exit(run.status ?? 1);
  }
}

/** Runs a program of an installed package: its path under node_modules, then its arguments. */
export const bin = (name, ...args) => sh(process.execPath, [path.join('node_modules', ...name), ...args]);
/** Runs programs of installed packages side by side; stops with the first status that is not 0, once all have ended. */
export async function together(...programs) {
  const ends = programs.map(
    ([file, ...args]) =>
      new Promise((resolve) => {
        const child = spawn(process.execPath, [path.join('node_modules', file), ...args], { stdio: 'inherit' });
        child.on('error', () => resolve(1));
        child.on('exit', (code) => resolve(code ?? 1));
      }),
  );
  const failed = (await Promise.all(ends)).find((code) => code !== 0);
  if (failed !== undefined) process.exit(failed);
}

const changed = (file) => (existsSync(file) ? statSync(file).mtimeMs : 0);

function newest(place) {
  if (!existsSync(place)) return 0;
  if (!statSync(place).isDirectory()) return changed(place);
  return Math.max(changed(place), ...readdirSync(place).map((name) => newest(path.join(place, name))));
}

export function install() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major !== 20 || minor < 19) {
    console.error(`Couplet runs on Node 20.19 or a later Node 20; this is ${process.version}.`);
    process.exit(1);
  }
  // npm writes this file last, so an install that was cut short is done again
  if (changed('node_modules/.package-lock.json') >= changed('package-lock.json')) return;
  console.log('Installing packages (SQLite compiles for a minute or two)…');
  // When the ready-made binary of sqlite3 cannot be fetched it compiles; use the headers that came with this Node, if any.
  const env = { ...process.env };
  const prefix = path.resolve(process.execPath, '../..');
  if (existsSync(path.join(prefix, 'include/node/node.h'))) env.npm_package_config_node_gyp_nodedir ??= prefix;
  sh('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], { env });
}

const SOURCES = ['src', 'public', 'samples', 'scripts', 'astro.config.mjs', 'tailwind.config.mjs', 'tsconfig.json', 'package-lock.json'];
const databaseSources = () =>
  readdirSync('db')
    .filter((name) => !name.includes('.sqlite'))
    .map((name) => path.join('db', name));

export function build() {
  const latest = Math.max(...[...SOURCES, ...databaseSources()].map(newest));
  if (changed(path.join(out, 'server/node/boot.mjs')) > latest) return;
  console.log('Building…');
  bin(['astro', 'astro.js'], 'build');
}

const BROWSERS = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

/** Finds Chromium for the browser tests; installs Debian's where that is possible. */
export function chromium() {
  const found = () => [process.env.CHROMIUM, ...BROWSERS].find((file) => file && existsSync(file));
  if (!found() && process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
    console.log('Installing Chromium…');
    sh('apt-get', ['update', '-qq'], { env });
    sh('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], { env, stdio: ['ignore', 'ignore', 'inherit'] });
  }
  if (!found()) {
    console.error('The browser tests need Chromium. Install it (Debian: sudo apt-get install chromium), or set CHROMIUM to its path.');
    process.exit(1);
  }
  process.env.CHROMIUM = found();
}
