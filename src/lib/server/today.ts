import { decisionsOf, findReading, listReadings, recentDecisions } from '@db';
import { can } from '@/lib/access';
import type { QueueItem, ReadingRow } from '@/lib/contracts';
import { moduleName } from './parts';
import type { SignedInPerson } from './people';
import { toReadingRow } from './readings';
import { reviewQueue } from './review';

export interface Approval {
  readonly readingId: number;
  readonly moduleId: number;
  readonly module: string;
  readonly vendor: string;
  readonly by: string;
  readonly at: string;
}

/** What waits for a person, and what was approved of late. Lists stay empty for what the roles do not bring. */
export interface Today {
  readonly drafts: readonly ReadingRow[];
  readonly returned: readonly (ReadingRow & { readonly reason: string })[];
  readonly handedIn: readonly ReadingRow[];
  readonly toReview: readonly QueueItem[];
  readonly approvals: readonly Approval[];
}

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

async function recentApprovals(): Promise<Approval[]> {
  const decisions = await recentDecisions(['approved'], RECENT);
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

export async function todayFor(actor: SignedInPerson): Promise<Today> {
  const toReview = can(actor, 'review.see') ? await reviewQueue(actor) : [];
  return { ...(await ownWork(actor)), toReview, approvals: await recentApprovals() };
}
