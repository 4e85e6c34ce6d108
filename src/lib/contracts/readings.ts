import { z } from 'zod';
import { benchDocument } from '@/lib/editor';
import type { ReadingResult } from '@/lib/reading';
import { RATING_KEYS } from '@/lib/reading';
import { instant, paragraph, readingState, rowId } from './common';
import { moduleView, pageView } from './parts';

const finite = z.number();
const px = z.tuple([finite, finite]);
const ratingKey = z.enum(RATING_KEYS);

const who = z.strictObject({ id: z.string(), name: z.string() });

export const decisionView = z.strictObject({
  what: z.enum(['handed-in', 'taken-back', 'returned', 'approved', 'superseded', 'withdrawn', 'restored']),
  reason: z.string(),
  by: who,
  at: instant,
  readingId: rowId,
});
export type DecisionView = z.infer<typeof decisionView>;

export const readingView = z.strictObject({
  id: rowId,
  version: z.int(),
  state: readingState,
  owner: who,
  module: moduleView,
  sheets: z.array(z.strictObject({ id: rowId, title: z.string(), number: z.string(), revision: z.string(), pages: z.array(pageView) })),
  document: benchDocument,
  savedAt: instant,
  savedBy: who,
  reason: z.string().nullable().describe('why it was returned, while it is'),
  decisions: z.array(decisionView),
  may: z.strictObject({ edit: z.boolean(), handIn: z.boolean(), takeBack: z.boolean(), decide: z.boolean() }),
});
export type ReadingView = z.infer<typeof readingView>;

export const readingRow = z.strictObject({
  id: rowId,
  module: z.string(),
  vendor: z.string(),
  moduleId: rowId,
  state: readingState,
  owner: who,
  savedAt: instant,
  charts: z.int(),
  curves: z.int(),
});
export type ReadingRow = z.infer<typeof readingRow>;

export const saveBody = z.strictObject({ document: benchDocument });
export const saveAnswer = z.strictObject({ version: z.int(), savedAt: instant });
export type SaveAnswer = z.infer<typeof saveAnswer>;

/** What a lost race answers beside its problem: the version that won. */
export const currentVersion = z.strictObject({ version: z.int(), document: benchDocument, savedAt: instant, savedBy: who });
export type CurrentVersion = z.infer<typeof currentVersion>;

export const residual = z.strictObject({
  chart: z.int(),
  curve: z.int(),
  point: z.int(),
  px,
  residual: finite,
  percentOfRange: finite,
  standardized: finite,
  omitted: z.boolean(),
});
export type Residual = z.infer<typeof residual>;

export const fittedCurve = z.strictObject({
  chart: z.int(),
  curve: z.int(),
  value: finite,
  points: z.array(px).describe('pixels of the picture'),
});
export type FittedCurve = z.infer<typeof fittedCurve>;

export const ratingBeside = z.strictObject({
  hotSideC: finite,
  key: ratingKey,
  printed: finite.nullable(),
  implied: finite.nullable(),
  u: finite.nullable(),
  unit: z.string(),
});
export type RatingBeside = z.infer<typeof ratingBeside>;

/** How the equations of the fit stood: full rank and a small condition number mean that the charts tell all parameters apart. */
export const fitNumbers = z.strictObject({
  rank: z.int(),
  condition: finite.nullable(),
  iterations: z.int(),
  converged: z.boolean(),
  why: z.string(),
});
export type FitNumbers = z.infer<typeof fitNumbers>;

export const modelBody = z.strictObject({ document: benchDocument });
export const modelAnswer = z.strictObject({
  result: z
    .custom<ReadingResult>((value) => typeof value === 'object' && value !== null)
    .nullable()
    .describe('a couplet.result, version 1'),
  fit: fitNumbers.nullable(),
  residuals: z.array(residual),
  curves: z.array(fittedCurve),
  ratings: z.array(ratingBeside),
  problems: z.array(z.strictObject({ chart: z.int().nullable(), text: z.string() })).describe('what is still missing, in sentences'),
});
export type ModelAnswer = z.infer<typeof modelAnswer>;

export const handInBody = z.strictObject({ note: paragraph(2000).default('') });
export const emptyBody = z.strictObject({});
export const reason = paragraph(2000).min(10, 'Say in a sentence what has to be mended, so that the engineer can.');
export const returnBody = z.strictObject({ reason });
export const stateAnswer = z.strictObject({ state: readingState, version: z.int() });
export type StateAnswer = z.infer<typeof stateAnswer>;

/** One reading that waits for a decision. */
export const queueItem = readingRow.extend({
  handedInAt: instant,
  note: z.string(),
  mayDecide: z.boolean().describe('false for one’s own work'),
});
export type QueueItem = z.infer<typeof queueItem>;

/** One figure of the model beside that of the model it would supersede. */
export const changeRow = z.strictObject({
  what: z.string(),
  unit: z.string(),
  before: finite.nullable(),
  after: finite.nullable(),
  u: finite.nullable(),
});
export type ChangeRow = z.infer<typeof changeRow>;

export const evidenceView = z.strictObject({
  reading: readingView,
  model: modelAnswer,
  hash: z.string().nullable().describe('of what was handed in; null for a draft'),
  handedInAt: instant.nullable(),
  mayDecide: z.boolean().describe('a librarian who has not worked on it, whatever its state'),
  ownWork: z.boolean().describe('this person has edited it or handed it in'),
  moduleChanged: z.array(z.string()).describe('what of the module was changed after the hand-in, in words'),
  approved: z
    .strictObject({ readingId: rowId, changes: z.array(changeRow) })
    .nullable()
    .describe('the model in the catalogue now, and what would change'),
});
export type EvidenceView = z.infer<typeof evidenceView>;
