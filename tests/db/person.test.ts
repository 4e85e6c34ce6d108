import { spawn } from 'node:child_process';
import { existsSync, rmSync } from 'node:fs';
import path from 'node:path';
import { text } from 'node:stream/consumers';
import { afterEach, expect, test } from 'vitest';
import { closeDatabase, findPersonByEmail, listPeople, listTrail, openDatabase } from '@db';
import { verifyPassword } from '@/lib/server/people';

const file = () => path.join(process.env.COUPLET_DATA!, 'couplet.sqlite');
afterEach(async () => {
  await closeDatabase();
  rmSync(file(), { force: true });
});

/** Runs the command and answers what it said on both streams. */
async function person(words: readonly string[], input = '') {
  const command = spawn(process.execPath, ['--import', 'tsx', 'scripts/person.ts', ...words]);
  command.stdin.end(input);
  const [out, err, status] = await Promise.all([
    text(command.stdout),
    text(command.stderr),
    new Promise<number | null>((resolve) => command.once('exit', resolve)),
  ]);
  return { out, err, status };
}

const ODD = ['--email', 'Odd@Kelda.example', '--name', 'Odd Brenner', '--roles', 'administrator, engineer'];

test('the first person of an empty database is made, and the password that is told signs in', { timeout: 120_000 }, async () => {
  const { out, err, status } = await person(ODD);
  expect([status, err]).toEqual([0, '']);
  const password = /Password, shown this once: (\S+)/.exec(out)?.[1] ?? '';
  await openDatabase(file());
  const made = await findPersonByEmail('odd@kelda.example');
  expect(made).toMatchObject({ name: 'Odd Brenner', email: 'odd@kelda.example', roles: ['administrator', 'engineer'] });
  expect(await verifyPassword(made!.passwordHash, password)).toBe(true);
  expect(await listTrail(5)).toMatchObject([{ action: 'added person', object: `person/${made!.id}`, by: '' }]);
  await closeDatabase();

  const again = await person(['--email', 'odd@kelda.example', '--name', 'Somebody', '--roles', 'designer']);
  expect(again).toMatchObject({ status: 1, out: '', err: expect.stringContaining('Odd Brenner already has this address') });
});

test('a password from standard input is taken as it is and is not told', { timeout: 120_000 }, async () => {
  const { out, status } = await person([...ODD, '--password-stdin'], ' kelp lantern Øre \nsecond line');
  expect(status).toBe(0);
  expect(out).not.toContain('lantern');
  await openDatabase(file());
  const [made] = await listPeople();
  expect(await verifyPassword(made!.passwordHash, ' kelp lantern Øre ')).toBe(true);
});

test.each([
  ['nothing at all', [], '', 'Still missing: --email, --name, --roles.'],
  ['an address that is none', ['--email', 'odd', '--name', 'Odd', '--roles', 'designer'], '', 'Enter an e-mail address'],
  ['a role that is none', ['--email', 'odd@kelda.example', '--name', 'Odd', '--roles', 'boss'], '', 'There is no role called boss'],
  ['a word it does not know', [...ODD, '--admin'], '', "Unknown option '--admin'"],
  ['a short password', [...ODD, '--password-stdin'], 'short\n', 'Use at least 10 characters'],
  ['a password that is guessed first', [...ODD, '--password-stdin'], 'couplet-couplet\n', 'one of the first that a guesser would try'],
])('%s is refused with a sentence, and no database is made', { timeout: 120_000 }, async (_what, words, input, sentence) => {
  const { out, err, status } = await person(words, input);
  expect([status, out]).toEqual([1, '']);
  expect(err).toContain(sentence);
  expect(err).not.toMatch(/\bat .*\.(ts|js|mjs):\d+/);
  expect(existsSync(file())).toBe(false);
});
