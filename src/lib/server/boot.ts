import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { closeDatabase, countPeople, migrate, openDatabase, selfCheck, useRollbackJournal } from '@db';
import { config } from './config';
import { requeueMailInHand } from './mail';
import { DEMO_PASSWORD, DEMO_PEOPLE, seedPeople } from './demo/people';

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

/** Before the port opens: settings, folders, migrations, the database's self-check, and demo data where it belongs. */
export async function boot(): Promise<BootReport> {
  const settings = config();
  for (const folder of [path.dirname(settings.databaseFile), settings.uploadsFolder]) mkdirSync(folder, { recursive: true });
  await openDatabase(settings.databaseFile);
  try {
    await useRollbackJournal();
    const migrated = await migrate();
    await selfCheck();
    await requeueMailInHand();
    const empty = (await countPeople()) === 0;
    if (empty && settings.demo) {
      await seedPeople();
    }
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
