import { decisionsOf, listReadings } from '@db';
import { can } from '@/lib/access';
import type { QueueItem } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from '../people';
import { accessOf, toReadingRow } from '../readings';

/** What waits for a decision, the longest waiting first; one's own work is listed but not to be decided on. */
export async function reviewQueue(actor: SignedInPerson): Promise<QueueItem[]> {
  requireCan(actor, 'review.see');
  const readings = await listReadings({ states: ['handed-in'] });
  const decisions = await decisionsOf(readings.map((reading) => reading.id));
  const items = readings.map((reading) => {
    const handedIn = decisions.findLast((decision) => decision.readingId === reading.id && decision.what === 'handed-in');
    return {
      ...toReadingRow(reading),
      handedInAt: (handedIn?.at ?? reading.savedAt).toISOString(),
      note: handedIn?.reason ?? '',
      mayDecide: can(actor, 'reading.decide', accessOf(reading)),
    };
  });
  return items.sort((a, b) => a.handedInAt.localeCompare(b.handedInAt));
}

/** How many readings wait for this person's decision; 0 for who may not review. */
export async function reviewCount(actor: SignedInPerson): Promise<number> {
  if (!can(actor, 'review.see')) return 0;
  return (await reviewQueue(actor)).filter((item) => item.mayDecide).length;
}
