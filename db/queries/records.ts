import { Op } from 'sequelize';
import { Counter, QueuedMail, TrailEntry, User } from '../models';

export interface TrailRecord {
  readonly id: number;
  readonly at: Date;
  readonly by: string;
  readonly action: string;
  readonly object: string;
  readonly detail: Readonly<Record<string, unknown>>;
}

export interface MailRecord {
  readonly id: number;
  readonly recipient: string;
  readonly subject: string;
  readonly body: string;
  readonly state: 'queued' | 'sending' | 'sent' | 'failed';
  readonly tries: number;
  readonly nextTryAt: Date;
  readonly lastError: string;
  readonly createdAt: Date;
  readonly sentAt: Date | null;
}

export async function addTrail(entry: {
  readonly userId: string | null;
  readonly action: string;
  readonly object?: string;
  readonly detail?: Readonly<Record<string, unknown>>;
}): Promise<void> {
  await TrailEntry.create({
    userId: entry.userId,
    action: entry.action,
    object: entry.object ?? '',
    detail: JSON.stringify(entry.detail ?? {}),
  });
}

export async function listTrail(limit: number, before = Number.MAX_SAFE_INTEGER): Promise<TrailRecord[]> {
  const rows = await TrailEntry.findAll({
    where: { id: { [Op.lt]: before } },
    include: [{ model: User, as: 'user' }],
    order: [['id', 'DESC']],
    limit,
  });
  return rows.map((row) => ({
    id: row.id,
    at: row.createdAt,
    by: row.user?.name ?? '',
    action: row.action,
    object: row.object ?? '',
    detail: JSON.parse(row.detail ?? '{}') as Record<string, unknown>,
  }));
}

const toMail = (row: QueuedMail): MailRecord => ({
  id: row.id,
  recipient: row.recipient,
  subject: row.subject,
  body: row.body,
  state: row.state,
  tries: row.tries,
  nextTryAt: row.nextTryAt,
  lastError: row.lastError ?? '',
  createdAt: row.createdAt,
  sentAt: row.sentAt ?? null,
});

export async function queueMail(mail: { readonly recipient: string; readonly subject: string; readonly body: string }): Promise<void> {
  await QueuedMail.create({ ...mail, nextTryAt: new Date() });
}

export async function dueMail(now: Date, limit: number): Promise<MailRecord[]> {
  const rows = await QueuedMail.findAll({ where: { state: 'queued', nextTryAt: { [Op.lte]: now } }, order: ['id'], limit });
  return rows.map(toMail);
}

/** Takes a queued mail for sending; false when another took it. */
export async function claimMail(id: number): Promise<boolean> {
  const [changed] = await QueuedMail.update({ state: 'sending' }, { where: { id, state: 'queued' } });
  return changed === 1;
}

export async function markMailSent(id: number, now: Date): Promise<void> {
  await QueuedMail.update({ state: 'sent', sentAt: now, lastError: '' }, { where: { id } });
}

export async function markMailFailed(id: number, tries: number, nextTryAt: Date | null, lastError: string): Promise<void> {
  await QueuedMail.update(nextTryAt ? { state: 'queued', tries, nextTryAt, lastError } : { state: 'failed', tries, lastError }, {
    where: { id },
  });
}

/** What a stopped process had in its hands, for the boot step to look at. */
export async function mailInHand(): Promise<MailRecord[]> {
  return (await QueuedMail.findAll({ where: { state: 'sending' } })).map(toMail);
}

export async function listMail(limit: number): Promise<MailRecord[]> {
  return (await QueuedMail.findAll({ order: [['id', 'DESC']], limit })).map(toMail);
}

export async function counter(name: 'catalogue'): Promise<number> {
  return (await Counter.findByPk(name))?.value ?? 0;
}

/** Raises a counter in the running transaction, so that who keeps copies knows to renew them. */
export async function raiseCounter(name: 'catalogue'): Promise<void> {
  await Counter.increment('value', { where: { name } });
}
