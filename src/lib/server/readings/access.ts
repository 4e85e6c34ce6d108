import { findReading, type ReadingRecord } from '@db';
import { can, type Access, type Action } from '@/lib/access';
import { requireCan, type SignedInPerson } from '../people';
import { notFound } from '../refusal';
import { isSettled } from '../settled';

/** What the matrix needs to know about a reading. */
export const accessOf = (reading: ReadingRecord): Access => ({
  ownerId: reading.owner.id,
  editorIds: reading.editorIds,
  approved: isSettled(reading.state),
});

/** A reading this person may see; one that may not be seen is answered as one that is not there. */
export async function readingFor(actor: SignedInPerson, id: number): Promise<ReadingRecord> {
  const reading = await findReading(id);
  if (!reading || !can(actor, 'reading.see', accessOf(reading))) throw notFound('reading');
  return reading;
}

/** A reading this person may do this to. */
export async function readingTo(action: Action, actor: SignedInPerson, id: number): Promise<ReadingRecord> {
  const reading = await readingFor(actor, id);
  requireCan(actor, action, accessOf(reading), SENTENCES[action]);
  return reading;
}

const SENTENCES: Partial<Record<Action, string>> = {
  'reading.edit': 'This reading belongs to somebody else: only its owner edits it.',
  'reading.handIn': 'This reading belongs to somebody else: only its owner hands it in.',
  'reading.takeBack': 'This reading belongs to somebody else: only its owner takes it back.',
  'reading.decide': 'You have worked on this reading yourself, so another librarian has to decide on it.',
};
