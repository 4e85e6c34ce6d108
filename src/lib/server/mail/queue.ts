import { claimMail, dueMail, mailInHand, markMailFailed, markMailSent, type MailRecord } from '@db';
import { log } from '../log';
import { sendMail } from './transport';

const BATCH = 20;
const FIRST_WAIT_MS = 30_000;
const LONGEST_WAIT_MS = 6 * 3_600_000;
/** About three days of trying. */
const MOST_TRIES = 20;
const LOOK_EVERY_MS = 30_000;

/** How long to wait after the n-th failed try: twice as long each time. */
export const waitAfter = (tries: number) => Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** (tries - 1));

async function deliver(mail: MailRecord): Promise<void> {
  if (!(await claimMail(mail.id))) return;
  const delivery = await sendMail(mail);
  if (delivery.status === 'sent') return markMailSent(mail.id, new Date());
  const tries = mail.tries + 1;
  log.warn({ mail: mail.id, tries, error: delivery.message }, 'mail not sent');
  return markMailFailed(mail.id, tries, tries < MOST_TRIES ? new Date(Date.now() + waitAfter(tries)) : null, delivery.message);
}

let running: Promise<void> | undefined;

async function deliverDue(): Promise<void> {
  for (let batch = await dueMail(new Date(), BATCH); batch.length > 0; batch = await dueMail(new Date(), BATCH))
    for (const mail of batch) await deliver(mail);
}

/** Sends what is due. A call while one runs makes it look once more at its end, so nothing queued meanwhile waits. */
export function deliverMail(): Promise<void> {
  running = (running ?? Promise.resolve()).then(deliverDue).catch((error: unknown) => log.error({ err: error }, 'mail queue'));
  return running;
}

/** Messages that a stopped process had in hand go back to the queue; their Message-ID stays, so a repeat is recognised. */
export async function requeueMailInHand(): Promise<void> {
  for (const mail of await mailInHand()) await markMailFailed(mail.id, mail.tries, new Date(), 'The server stopped while sending.');
}

let timer: NodeJS.Timeout | undefined;

/** Looks at the queue now and then; once a process. */
export function keepMailGoing(): void {
  timer ??= setInterval(() => void deliverMail(), LOOK_EVERY_MS).unref();
}
