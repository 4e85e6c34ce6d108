import {
  addDecision,
  addEditor,
  addTrail,
  approvedReadingOf,
  createModel,
  findPerson,
  findReading,
  inTransaction,
  latestModel,
  moveReading,
  raiseCounter,
  type DecisionKind,
  type ReadingRecord,
  type ReadingState,
} from '@db';
import type { StateAnswer } from '@/lib/contracts';
import type { BenchDocument } from '@/lib/editor';
import { ENGINE, hashMaterial } from '@/lib/reading';
import { canonicalHash } from '../hash';
import { deliverMail, tellLibrarians, tellOwner } from '../mail';
import type { SignedInPerson } from '../people';
import { fitDraft, readingTo, readingView } from '../readings';
import { conflict, lostRace, wrongInput } from '../refusal';
import { hashOfStored } from './model-hash';

const WORDS: Readonly<Record<ReadingState, string>> = {
  draft: 'a draft',
  'handed-in': 'handed in',
  returned: 'returned',
  approved: 'approved',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
};

function requireState(reading: ReadingRecord, ...states: ReadingState[]): void {
  if (states.includes(reading.state)) return;
  const wanted = states.map((state) => WORDS[state]).join(' or ');
  throw conflict(
    `This reading is ${WORDS[reading.state]} now; for this it has to be ${wanted}. Load the page again to see it as it is.`,
    'wrong-state',
  );
}

/** Moves a reading on over the version that the person saw, and writes down who did it and why. */
async function move(
  actor: SignedInPerson,
  reading: ReadingRecord,
  step: {
    readonly version: number;
    readonly to: ReadingState;
    readonly what: DecisionKind;
    readonly reason: string;
    readonly modelId: number | null;
  },
): Promise<void> {
  const moved = reading.version === step.version && (await moveReading(reading.id, step.version, reading.state, step.to));
  if (!moved) throw lostRace(await readingView(actor, reading.id));
  await addDecision({ readingId: reading.id, what: step.what, reason: step.reason, userId: actor.id, modelId: step.modelId });
  await addTrail({
    userId: actor.id,
    action: step.what,
    object: `reading/${reading.id}`,
    detail: step.reason ? { reason: step.reason } : {},
  });
}

const stateOf = async (id: number): Promise<StateAnswer> => {
  const reading = await findReading(id);
  return { state: reading?.state ?? 'draft', version: reading?.version ?? 0 };
};

/** Runs a transition in one transaction, then lets the mail go. */
async function transition(id: number, work: () => Promise<void>): Promise<StateAnswer> {
  await inTransaction(work);
  void deliverMail();
  return stateOf(id);
}

/** What keeps a draft from being handed in, as one sentence; null when nothing does. */
function obstacle(fitted: Awaited<ReturnType<typeof fitDraft>>): string | null {
  const [problem] = fitted.conversion.problems;
  if (problem) return problem.text;
  if (!fitted.read) return 'There is no chart to hand in: add one, frame it and read its curves.';
  return fitted.read.result.modelMissing;
}

/** Asks for review: fits the stored draft, keeps document, result and hash together, and tells the librarians. */
export async function handIn(actor: SignedInPerson, id: number, version: number, note: string): Promise<StateAnswer> {
  const before = await readingTo('reading.handIn', actor, id);
  requireState(before, 'draft', 'returned');
  if (before.version !== version) throw lostRace(await readingView(actor, id)); // what is fitted is what was named
  const fitted = await fitDraft(before, JSON.parse(before.document) as BenchDocument);
  const why = obstacle(fitted);
  if (why || !fitted.read || !fitted.document) throw wrongInput({ document: why ?? 'This draft cannot be read.' });
  const { result } = fitted.read;
  const model = {
    readingId: id,
    moduleId: before.module.id,
    document: JSON.stringify(fitted.document),
    result: JSON.stringify(result),
    engine: ENGINE,
    hash: canonicalHash(hashMaterial(fitted.document, fitted.pixelsSha256, result.model, ENGINE)),
  };
  return transition(id, async () => {
    const reading = await readingTo('reading.handIn', actor, id);
    requireState(reading, 'draft', 'returned');
    const modelId = await createModel(model);
    await addEditor(id, actor.id);
    await move(actor, reading, { version, to: 'handed-in', what: 'handed-in', reason: note, modelId });
    await tellLibrarians(reading, actor.name, note);
  });
}

/** The owner takes back what was handed in; it is a draft again. */
export const takeBack = (actor: SignedInPerson, id: number, version: number): Promise<StateAnswer> =>
  transition(id, async () => {
    const reading = await readingTo('reading.takeBack', actor, id);
    requireState(reading, 'handed-in');
    await move(actor, reading, { version, to: 'draft', what: 'taken-back', reason: '', modelId: null });
  });

async function tell(
  reading: ReadingRecord,
  actor: SignedInPerson,
  what: 'approved' | 'returned' | 'withdrawn' | 'restored',
  reason: string,
) {
  const owner = await findPerson(reading.owner.id);
  if (owner && !owner.disabled) await tellOwner(reading, owner.email, { what, by: actor.name, reason });
}

/** The approved reading of the same module steps back. */
async function supersede(actor: SignedInPerson, moduleId: number): Promise<void> {
  const old = await approvedReadingOf(moduleId);
  if (!old) return;
  await move(actor, old, { version: old.version, to: 'superseded', what: 'superseded', reason: '', modelId: null });
}

/** The model of a reading, unless what is stored does not give its hash any more. */
async function intactModel(id: number) {
  const model = await latestModel(id);
  if (!model) throw conflict('There is no model to approve.');
  if (hashOfStored(model) !== model.hash)
    throw conflict('What was handed in has changed since, so it cannot be approved. Return it, and have it handed in again.', 'hash');
  return model;
}

/** Approves: freezes the reading, supersedes an older one, and renews the catalogue. */
export const approve = (actor: SignedInPerson, id: number, version: number): Promise<StateAnswer> =>
  transition(id, async () => {
    const reading = await readingTo('reading.decide', actor, id);
    requireState(reading, 'handed-in');
    const model = await intactModel(id);
    await supersede(actor, reading.module.id);
    await move(actor, reading, { version, to: 'approved', what: 'approved', reason: '', modelId: model.id });
    await raiseCounter('catalogue');
    await tell(reading, actor, 'approved', '');
  });

/** Returns to the engineer what was handed in, with a reason. */
export const returnToOwner = (actor: SignedInPerson, id: number, version: number, reason: string): Promise<StateAnswer> =>
  transition(id, async () => {
    const reading = await readingTo('reading.decide', actor, id);
    requireState(reading, 'handed-in');
    await move(actor, reading, { version, to: 'returned', what: 'returned', reason, modelId: null });
    await tell(reading, actor, 'returned', reason);
  });

/** Takes an approved reading out of the catalogue, with a reason; it can be restored. */
export const withdraw = (actor: SignedInPerson, id: number, version: number, reason: string): Promise<StateAnswer> =>
  transition(id, async () => {
    const reading = await readingTo('reading.decide', actor, id);
    requireState(reading, 'approved');
    await move(actor, reading, { version, to: 'withdrawn', what: 'withdrawn', reason, modelId: null });
    await raiseCounter('catalogue');
    await tell(reading, actor, 'withdrawn', reason);
  });

/** Brings a withdrawn reading back: approved again, or superseded where a newer one stands. */
export const restore = (actor: SignedInPerson, id: number, version: number): Promise<StateAnswer> =>
  transition(id, async () => {
    const reading = await readingTo('reading.decide', actor, id);
    requireState(reading, 'withdrawn');
    const newer = await approvedReadingOf(reading.module.id);
    await move(actor, reading, { version, to: newer ? 'superseded' : 'approved', what: 'restored', reason: '', modelId: null });
    await raiseCounter('catalogue');
    await tell(reading, actor, 'restored', '');
  });
