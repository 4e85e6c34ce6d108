import { z } from 'zod';
import { instant, rowId } from './common';
import { queueItem, readingRow } from './readings';

export const approval = z.strictObject({
  readingId: rowId,
  moduleId: rowId,
  module: z.string(),
  vendor: z.string(),
  by: z.string(),
  at: instant,
});
export type Approval = z.infer<typeof approval>;

/** What waits for a person, and what was approved of late. Lists stay empty for what the roles do not bring. */
export const today = z.strictObject({
  drafts: z.array(readingRow),
  returned: z.array(readingRow.extend({ reason: z.string() })),
  handedIn: z.array(readingRow).describe('one’s own work that waits for a librarian'),
  toReview: z.array(queueItem),
  approvals: z.array(approval).describe('newest first, of readings that are approved still'),
});
export type Today = z.infer<typeof today>;
