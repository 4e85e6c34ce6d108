import { peopleWithRole, queueMail, type ReadingRecord } from '@db';
import { config } from '../config';
import { moduleName } from '../parts';

const link = (path: string) => new URL(path, config().publicAddress).href;
const titleOf = (reading: ReadingRecord) => `${reading.module.vendor.name} ${moduleName(reading.module)}`;

/** Queues, in the running transaction, a letter to every librarian who may decide. */
export async function tellLibrarians(reading: ReadingRecord, by: string, note: string): Promise<void> {
  const librarians = (await peopleWithRole('librarian')).filter(({ id }) => id !== reading.owner.id && !reading.editorIds.includes(id));
  const body = [
    `${by} handed in a reading of ${titleOf(reading)} and asks for review.`,
    ...(note ? ['', note] : []),
    '',
    link(`/review/${reading.id}`),
  ].join('\n');
  for (const librarian of librarians) await queueMail({ recipient: librarian.email, subject: `To review: ${titleOf(reading)}`, body });
}

const SUBJECTS = { approved: 'Approved', returned: 'Returned', withdrawn: 'Withdrawn', restored: 'Restored' } as const;

/** Queues, in the running transaction, a letter to the reading's owner about what was decided. */
export async function tellOwner(
  reading: ReadingRecord,
  ownerEmail: string,
  decision: { readonly what: keyof typeof SUBJECTS; readonly by: string; readonly reason: string },
): Promise<void> {
  const page = decision.what === 'returned' ? `/bench/${reading.id}` : `/review/${reading.id}`;
  const body = [
    `${decision.by} ${decision.what} the reading of ${titleOf(reading)}.`,
    ...(decision.reason ? ['', decision.reason] : []),
    '',
    link(page),
  ].join('\n');
  await queueMail({ recipient: ownerEmail, subject: `${SUBJECTS[decision.what]}: ${titleOf(reading)}`, body });
}
