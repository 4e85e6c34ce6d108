import { afterEach, expect, test } from 'vitest';
import { claimMail, dueMail, listMail, queueMail } from '@db';
import { deliverMail, forgetTransport, outbox, remembered, requeueMailInHand, waitAfter } from '@/lib/server/mail';
import { Refusal } from '@/lib/server/refusal';
import { connection } from '../../db/database';
import { person, useDatabase } from '../support/database';

useDatabase();
afterEach(async () => {
  await deliverMail();
  remembered.length = 0;
  forgetTransport();
});

const queue = async (count: number) => {
  for (let n = 1; n <= count; n++)
    await queueMail({ recipient: `reader-${n}@kelda.example`, subject: `To review ${n}`, body: 'See /review/1' });
};

test('every message is sent once, however often the queue is looked at', async () => {
  await queue(45); // more than two batches
  await Promise.all([deliverMail(), deliverMail(), deliverMail()]);
  await deliverMail();
  expect(remembered.map((mail) => mail.recipient)).toHaveLength(45);
  expect(new Set(remembered.map((mail) => mail.recipient)).size).toBe(45);
  expect((await listMail(100)).every((mail) => mail.state === 'sent' && mail.sentAt !== null)).toBe(true);
});

test('of several who take one message from the queue exactly one gets it', async () => {
  await queue(1);
  const [mail] = await dueMail(new Date(), 10);
  const claims = await Promise.all(Array.from({ length: 8 }, () => claimMail(mail!.id)));
  expect(claims.filter(Boolean)).toHaveLength(1);
});

test('a message that is not due yet waits', async () => {
  await queue(2);
  const later = new Date(Date.now() + 3_600_000).toISOString();
  await connection().query(`UPDATE mail_queue SET next_try_at = '${later}' WHERE id = 1`);
  await deliverMail();
  expect(remembered.map((mail) => mail.id)).toEqual([2]);
});

test('a message that a stopped process had in hand is sent by the next one', async () => {
  await queue(2);
  await claimMail(1);
  await deliverMail();
  expect(remembered.map((mail) => mail.id)).toEqual([2]);
  await requeueMailInHand();
  expect((await listMail(10)).find((mail) => mail.id === 1)).toMatchObject({ state: 'queued', tries: 0 });
  await deliverMail();
  expect(remembered.map((mail) => mail.id)).toEqual([2, 1]);
});

test('the wait doubles with each failed try, from half a minute to at most six hours', () => {
  const waits = Array.from({ length: 20 }, (_, at) => waitAfter(at + 1) / 1000);
  expect(waits.slice(0, 4)).toEqual([30, 60, 120, 240]);
  expect(Math.max(...waits)).toBe(6 * 3600);
});

test('the outbox shows what became of each message, to the administrator alone', async () => {
  await queue(1);
  await deliverMail();
  await queueMail({ recipient: 'late@kelda.example', subject: 'Approved', body: '' });
  const shown = await outbox(await person(['administrator']));
  expect(shown.map(({ id, state, nextTryAt, sentAt }) => [id, state, nextTryAt !== null, sentAt !== null])).toEqual([
    [2, 'queued', true, false],
    [1, 'sent', false, true],
  ]);
  for (const role of ['engineer', 'librarian', 'designer'] as const) await expect(outbox(await person([role]))).rejects.toThrow(Refusal);
});
