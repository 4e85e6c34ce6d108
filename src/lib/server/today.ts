import { decisionsOf, findReading, listReadings, recentApprovals } from '@db';
import { can } from '@/lib/access';
import type { Approval, Today } from '@/lib/contracts';
import { moduleName } from './parts';
import type { SignedInPerson } from './people';
import { toReadingRow } from './readings';
import { reviewQueue } from './review';

const RECENT = 8;

async function ownWork(actor: SignedInPerson) {
  if (!can(actor, 'reading.start')) return { drafts: [], returned: [], handedIn: [] };
  const readings = await listReadings({ ownerId: actor.id, states: ['draft', 'returned', 'handed-in'] });
  const decisions = await decisionsOf(readings.filter((reading) => reading.state === 'returned').map((reading) => reading.id));
  const reasonOf = (id: number) =>
    decisions.findLast((decision) => decision.readingId === id && decision.what === 'returned')?.reason ?? '';
  const rows = readings.map(toReadingRow);
  return {
    drafts: rows.filter((row) => row.state === 'draft'),
    returned: rows.filter((row) => row.state === 'returned').map((row) => ({ ...row, reason: reasonOf(row.id) })),
    handedIn: rows.filter((row) => row.state === 'handed-in'),
  };
}

async function approvals(): Promise<Approval[]> {
  const decisions = await recentApprovals(RECENT);
  const readings = await Promise.all(decisions.map((decision) => findReading(decision.readingId)));
  return decisions.flatMap((decision, at) => {
    const reading = readings[at];
    if (!reading) return [];
    const { module } = reading;
    return [
      {
        readingId: reading.id,
        moduleId: module.id,
        module: moduleName(module),
        vendor: module.vendor.name,
        by: decision.by.name,
        at: decision.at.toISOString(),
      },
    ];
  });
}

/** What waits for a person, by their roles, and what was approved of late and stands still. */
export async function todayFor(actor: SignedInPerson): Promise<Today> {
  const toReview = can(actor, 'review.see') ? await reviewQueue(actor) : [];
  return { ...(await ownWork(actor)), toReview, approvals: await approvals() };
}
