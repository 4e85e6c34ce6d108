import { readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { simpleParser } from 'mailparser';
import { afterEach, expect, test, vi } from 'vitest';
import { listMail, queueMail } from '@db';
import { deliverMail, requeueMailInHand } from '@/lib/server/mail';
import { connection } from '../../db/database';
import { useDatabase } from '../support/database';

vi.hoisted(() => (process.env.COUPLET_MAIL = 'outbox'));

const folder = () => path.join(process.env.COUPLET_DATA!, 'outbox');
useDatabase();
afterEach(() => rmSync(folder(), { recursive: true, force: true }));

test('every message is one file, numbered, that a mail program opens', async () => {
  const body =
    'Soren Quill returned the reading of Ormsund Cold Brimstead 40-C.\n\nΔT runs from 0 to 70 K, not to 60 K.\n\nhttp://localhost:4321/bench/1';
  await queueMail({ recipient: 'ilse@kelda.example', subject: 'Returned: Ørmsund Cold', body });
  await queueMail({ recipient: 'soren@kelda.example', subject: 'To review: Ormsund Cold', body: 'See /review/1' });
  await deliverMail();
  expect(readdirSync(folder()).sort()).toEqual(['000001.eml', '000002.eml']);
  const mail = await simpleParser(readFileSync(path.join(folder(), '000001.eml')));
  expect(mail.subject).toBe('Returned: Ørmsund Cold');
  expect([mail.to].flat().map((to) => to?.text)).toEqual(['ilse@kelda.example']);
  expect(mail.from?.text).toBe('"Couplet" <couplet@localhost>');
  expect(mail.text?.trim()).toBe(body);
});

test('a message that is sent again after a stop writes over its own file', async () => {
  await queueMail({ recipient: 'ilse@kelda.example', subject: 'Approved', body: 'It is in the catalogue.' });
  await deliverMail();
  const idOf = async () => (await simpleParser(readFileSync(path.join(folder(), '000001.eml')))).messageId;
  const first = await idOf();
  await connection().query(`UPDATE mail_queue SET state = 'sending', sent_at = NULL`);
  await requeueMailInHand();
  await deliverMail();
  expect(readdirSync(folder())).toEqual(['000001.eml']);
  expect(await idOf()).toBe(first);
});

test('a folder that cannot be written is a failed try, told in the row, and no message is lost', async () => {
  writeFileSync(folder(), 'a file stands where the folder should be');
  await queueMail({ recipient: 'ilse@kelda.example', subject: 'Approved', body: '' });
  await deliverMail();
  expect((await listMail(1))[0]).toMatchObject({ state: 'queued', tries: 1, lastError: expect.stringMatching(/EEXIST|ENOTDIR/) });
});
