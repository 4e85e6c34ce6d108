import { closeSync, fsyncSync, mkdirSync, openSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';
import { closeDatabase, countPeople, findPerson, migrate, openDatabase, selfCheck, useRollbackJournal } from '@db';
import { config } from './config';
import { DEMO_PASSWORD, DEMO_PEOPLE, demoPersonId, seedPeople } from './demo/people';
import { seedSamples } from './demo/seed';
import { deliverMail, requeueMailInHand } from './mail';

/** What a start has to tell. */
export interface BootReport {
  readonly address: string;
  readonly host: string;
  readonly port: number;
  readonly trustProxy: boolean;
  readonly secure: boolean;
  readonly lines: readonly string[];
}

const width = Math.max(...DEMO_PEOPLE.map((person) => person.email.length));

const demoLines = () => [
  `Demo sign-ins, all with the password ${DEMO_PASSWORD}:`,
  ...DEMO_PEOPLE.map((person) => `  ${person.email.padEnd(width)}  ${person.roles.join(' and ')}`),
];

const FIRST_ADMINISTRATOR = [
  'Nobody can sign in yet. Make the first administrator with:',
  '  npm run person -- --email you@example.org --name "Your Name" --roles administrator',
];

/** Opens a database file, brings it up to date and looks at it; answers what was migrated. */
async function openWhole(file: string): Promise<string[]> {
  await openDatabase(file);
  await useRollbackJournal();
  const migrated = await migrate();
  await selfCheck();
  return migrated;
}

function syncFile(file: string): void {
  const handle = openSync(file, 'r');
  fsyncSync(handle);
  closeSync(handle);
}

/** Seeds the demo beside the empty database and puts it in its place at the end, so that it is never there in part. */
async function replaceByDemo(file: string, what: 'whole' | 'people'): Promise<void> {
  await closeDatabase();
  const draft = `${file}.new`;
  for (const old of [draft, `${draft}-journal`]) rmSync(old, { force: true });
  await openDatabase(draft, 'OFF');
  await migrate();
  await seedPeople();
  if (what === 'whole') {
    console.log('Bringing in the demo’s sheets and readings…');
    await seedSamples(path.resolve('samples'));
    await deliverMail();
  }
  await closeDatabase();
  syncFile(draft);
  renameSync(draft, file);
  syncFile(path.dirname(file));
  await openWhole(file);
}

/** Everybody knows their password: outside demo mode a database that holds them must not be served. */
async function refuseDemoPeople(): Promise<void> {
  const there = await Promise.all(DEMO_PEOPLE.map((person) => findPerson(demoPersonId(person))));
  if (!there.some((person) => person && !person.disabled)) return;
  throw new Error(
    'This database holds demo people, whose password is well known, so it is not served with COUPLET_DEMO=off. Set COUPLET_DATA to an empty folder to start afresh.',
  );
}

/** Before the port opens: settings, folders, migrations, the database's self-check, and demo data where it belongs. */
export async function boot(): Promise<BootReport> {
  const settings = config();
  for (const folder of [path.dirname(settings.databaseFile), settings.uploadsFolder]) mkdirSync(folder, { recursive: true });
  try {
    const migrated = await openWhole(settings.databaseFile);
    await requeueMailInHand();
    const empty = (await countPeople()) === 0;
    if (!settings.demo) await refuseDemoPeople();
    if (empty && settings.demo) await replaceByDemo(settings.databaseFile, settings.demoData);
    return {
      address: settings.publicAddress.origin,
      host: settings.host,
      port: settings.port,
      trustProxy: settings.trustProxy,
      secure: settings.secure,
      lines: [
        ...(migrated.length > 0 ? [`Database migrated: ${migrated.join(', ')}`] : []),
        ...(settings.demo ? demoLines() : empty ? FIRST_ADMINISTRATOR : []),
      ],
    };
  } finally {
    await closeDatabase();
  }
}
