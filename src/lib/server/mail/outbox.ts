import { listMail, type MailRecord } from '@db';
import type { MailItem } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from '../people';

const toItem = (mail: MailRecord): MailItem => ({
  ...mail,
  nextTryAt: mail.state === 'queued' ? mail.nextTryAt.toISOString() : null,
  createdAt: mail.createdAt.toISOString(),
  sentAt: mail.sentAt?.toISOString() ?? null,
});

/** The newest messages, with what became of each. */
export async function outbox(actor: SignedInPerson, limit = 200): Promise<MailItem[]> {
  requireCan(actor, 'outbox.see');
  return (await listMail(limit)).map(toItem);
}
