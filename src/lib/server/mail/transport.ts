import { mkdirSync } from 'node:fs';
import { writeFile } from 'node:fs/promises';
import path from 'node:path';
import nodemailer from 'nodemailer';
import type { MailRecord } from '@db';
import { config } from '../config';

/** What happened to one message. */
export type Delivery = { readonly status: 'sent' } | { readonly status: 'error'; readonly message: string };

type Send = (mail: MailRecord) => Promise<void>;

/** The same for every try, so that a receiving server can drop a repeat. */
const messageId = (mail: MailRecord) => `<couplet-${mail.id}-${mail.createdAt.getTime()}@${config().publicAddress.hostname}>`;

const message = (mail: MailRecord) => ({
  from: config().mail.from,
  to: mail.recipient,
  subject: mail.subject,
  text: mail.body,
  date: mail.createdAt,
  messageId: messageId(mail),
});

function bySmtp(url: string): Send {
  const transporter = nodemailer.createTransport(url, { from: config().mail.from });
  return async (mail) => {
    await transporter.sendMail(message(mail));
  };
}

/** One file a message, named by its number: a repeat writes the same file. */
function toOutbox(): Send {
  const composer = nodemailer.createTransport({ streamTransport: true, buffer: true, newline: 'unix' });
  return async (mail) => {
    mkdirSync(config().outboxFolder, { recursive: true });
    const { message: bytes } = await composer.sendMail(message(mail));
    await writeFile(path.join(config().outboxFolder, `${String(mail.id).padStart(6, '0')}.eml`), bytes as Buffer);
  };
}

/** What the memory transport was given, for tests. */
export const remembered: MailRecord[] = [];

function choose(): Send {
  const { transport, smtpUrl } = config().mail;
  if (transport === 'smtp') return bySmtp(smtpUrl ?? '');
  if (transport === 'outbox') return toOutbox();
  return async (mail) => {
    remembered.push(mail);
  };
}

let send: Send | undefined;

/** Sends one message by the configured transport. */
export async function sendMail(mail: MailRecord): Promise<Delivery> {
  try {
    await (send ??= choose())(mail);
    return { status: 'sent' };
  } catch (error) {
    return { status: 'error', message: error instanceof Error ? error.message : String(error) };
  }
}

/** For tests: the next message chooses its transport anew. */
export const forgetTransport = () => (send = undefined);
