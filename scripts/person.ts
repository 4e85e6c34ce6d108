// `npm run person`: makes a person in the configured database and tells a random password once.
import './env';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { text } from 'node:stream/consumers';
import { parseArgs } from 'node:util';
import { addPersonBody, newPassword, type AddPersonBody } from '@/lib/contracts';
import { ROLES } from '@/lib/access';
import { config } from '@/lib/server/config';

const USAGE = `Usage: npm run person -- --email you@example.org --name "Your Name" --roles administrator
  --roles           one or several of ${ROLES.join(', ')}, with commas between
  --password-stdin  reads the password from standard input instead of making a random one`;

/** Something to tell the person at the keyboard; everything else is a fault of the program. */
class Wrong extends Error {}

interface Wish {
  readonly body: AddPersonBody;
  readonly passwordFromInput: boolean;
}

function parseWords(words: string[]) {
  const options = {
    email: { type: 'string' },
    name: { type: 'string' },
    roles: { type: 'string' },
    'password-stdin': { type: 'boolean', default: false },
    help: { type: 'boolean', default: false },
  } as const;
  try {
    return parseArgs({ args: words, options }).values;
  } catch (error) {
    throw new Wrong(`${error instanceof Error ? error.message.split('. ')[0] : error}.\n${USAGE}`);
  }
}

function readRoles(list: string): string[] {
  const roles = list
    .split(',')
    .map((word) => word.trim())
    .filter(Boolean);
  const unknown = roles.filter((word) => !(ROLES as readonly string[]).includes(word));
  if (unknown.length > 0) throw new Wrong(`There is no role called ${unknown.join(' or ')}: choose from ${ROLES.join(', ')}.`);
  return roles;
}

function readWish(words: string[]): Wish | null {
  const given = parseWords(words);
  if (given.help) return null;
  const missing = (['email', 'name', 'roles'] as const).filter((option) => given[option] === undefined);
  if (missing.length > 0) throw new Wrong(`Still missing: ${missing.map((option) => `--${option}`).join(', ')}.\n${USAGE}`);
  const parsed = addPersonBody.safeParse({ email: given.email, name: given.name, roles: readRoles(given.roles ?? '') });
  if (!parsed.success) throw new Wrong(parsed.error.issues.map((issue) => `--${String(issue.path[0])}: ${issue.message}`).join('\n'));
  return { body: parsed.data, passwordFromInput: given['password-stdin'] };
}

/** The first line of standard input, kept exactly as it is but for its line end. */
async function readPassword(): Promise<string> {
  const [line = ''] = (await text(process.stdin)).split(/\r?\n/);
  const parsed = newPassword.safeParse(line);
  if (!parsed.success) throw new Wrong(`The password on standard input cannot be used. ${parsed.error.issues[0]?.message}`);
  return parsed.data;
}

async function make({ body, passwordFromInput }: Wish): Promise<void> {
  const { databaseFile, demo } = config();
  const [db, people, { Refusal }] = await Promise.all([import('@db'), import('@/lib/server/people'), import('@/lib/server/refusal')]);
  const password = passwordFromInput ? await readPassword() : people.randomPassword();
  if (people.tooEasy(password, body)) throw new Wrong(`The password on standard input cannot be used. ${people.TOO_EASY}`);
  const passwordHash = await people.hashPassword(password);
  mkdirSync(path.dirname(databaseFile), { recursive: true });
  await db.openDatabase(databaseFile);
  try {
    await db.useRollbackJournal();
    await db.migrate();
    await db.selfCheck();
    const first = (await db.countPeople()) === 0;
    await db.inTransaction(() => people.makePerson(body, passwordHash, null));
    console.log(`${body.name} can sign in as ${body.email} (${body.roles.join(', ')}).`);
    if (!passwordFromInput) console.log(`Password, shown this once: ${password}\nChange it after the first sign-in, under Account.`);
    if (first && demo)
      console.log('Note: demo mode is on, and its people are made only while there is nobody. Set COUPLET_DEMO=off for real work.');
  } catch (error) {
    throw error instanceof Refusal ? new Wrong(error.message) : error;
  } finally {
    await db.closeDatabase();
  }
}

async function run(): Promise<number> {
  try {
    const wish = readWish(process.argv.slice(2));
    if (!wish) console.log(USAGE);
    else await make(wish);
    return 0;
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    return 1;
  }
}

process.exitCode = await run();
