import { z } from 'zod';
import { QUANTITIES, RATING_KEYS, UNITS } from './quantities';

/** No chart, module or duty has a number beyond this; within it nothing overflows on the way to a model. */
const LARGEST = 1e9;
const TOO_LARGE = { error: 'No chart reads so far: give a number between −1 000 000 000 and 1 000 000 000.' };
const number = z.number({ error: 'Give a number.' }).min(-LARGEST, TOO_LARGE).max(LARGEST, TOO_LARGE);
const positive = number.positive({ error: 'Give a number above zero.' });
const celsius = number.min(-273.15, { error: 'Nothing is colder than −273.15\u00A0°C.' });
const name = z
  .string({ error: 'Give some text.' })
  .trim()
  .min(1, { error: 'Give some text.' })
  .max(200, { error: 'Keep this below 200 characters.' });
const px = z.tuple([number, number], { error: 'Give a pixel as two numbers, [x, y].' });

/** Notes are hashed with the document, so they may not be deeper than a hash can follow. */
const DEEPEST_NOTE = 40;
function isShallow(value: unknown, levels = DEEPEST_NOTE): boolean {
  if (value === null || typeof value !== 'object') return true;
  return levels > 0 && Object.values(value).every((inner) => isShallow(inner, levels - 1));
}
const note = z
  .unknown()
  .refine((value) => isShallow(value), { error: `Keep a note at most ${DEEPEST_NOTE} levels deep.` })
  .optional();
const one = <const T extends readonly [string, ...string[]]>(values: T) => z.enum(values, { error: `Use one of: ${values.join(', ')}.` });

const rated = z.strictObject({
  hotSideC: celsius.optional(),
  imaxA: positive.optional(),
  vmaxV: positive.optional(),
  qmaxW: positive.optional(),
  dTmaxK: positive.optional(),
  imaxMeans: one(['largestDeltaT', 'mostHeat', 'allowed', 'notStated']).optional(),
  basis: one(['typical', 'minimum', 'calculated', 'measured', 'notStated']).optional(),
  atmosphere: one(['vacuum', 'dryNitrogen', 'air', 'notStated']).optional(),
  tolerancePercent: number.min(0).max(100).optional(),
  note,
});

const plate = z.tuple([positive, positive], { error: 'Give two lengths in millimetres, [along, across].' });

const module = z.strictObject({
  vendor: name,
  partNumber: name,
  variant: z.string().max(200).optional(),
  stages: number.int().positive().optional(),
  couples: number.int().positive().optional(),
  coldPlateMm: plate.optional(),
  hotPlateMm: plate.optional(),
  heightMm: positive.optional(),
  maxTemperatureC: celsius.optional(),
  leadsOhm: number.min(0).optional(),
  rated: z.array(rated).optional(),
  acResistanceOhm: positive.optional(),
  acResistanceAtC: celsius.optional(),
  note,
});

const shown = { quantity: one(QUANTITIES), unit: one(UNITS), of: one(RATING_KEYS).optional(), note };
const axis = z.strictObject({ ...shown, scale: one(['linear', 'log']).optional() });
const family = z.strictObject(shown);

const mark = z.strictObject({ px, x: number.optional(), y: number.optional(), note });

const curve = z.strictObject({
  value: number,
  start: px.optional(),
  through: z.array(px).optional(),
  points: z.array(px).min(1, { error: 'A curve needs at least one point.' }).optional(),
  by: one(['hand', 'followed', 'path']).optional(),
  note,
});

const chart = z.strictObject({
  image: name,
  x: axis,
  y: axis,
  family,
  hotSideC: celsius.optional(),
  coldSideC: celsius.optional(),
  frame: one(['upright', 'turned', 'perspective']).optional(),
  marks: z.array(mark).optional(),
  curves: z.array(curve).optional(),
  note,
});

const model = z.strictObject({
  form: one(['auto', 'constant', 'shaped', 'leg']).optional(),
  use: z
    .array(one(['curves', 'ratings', 'acResistance']))
    .min(1, { error: 'Name at least one thing the model may use.' })
    .optional(),
  note,
});

const prediction = z.strictObject({
  hotSideC: celsius.optional(),
  coldSideC: celsius.optional(),
  deltaT: number,
  I: number.optional(),
  V: number.optional(),
  note,
});

/** Shape of the reading document, version 1. What one key means for another is checked by `parseReadingDocument`. */
export const readingDocument = z.strictObject({
  format: z.literal('couplet.reading', { error: 'This is not a reading: "format" must be "couplet.reading".' }),
  version: z.literal(1, { error: 'This program reads version 1 of the reading document.' }),
  module,
  charts: z.array(chart),
  model: model.optional(),
  predict: z.array(prediction).optional(),
  note,
});

type Frozen<T> = T extends readonly unknown[] | object ? { readonly [K in keyof T]: Frozen<T[K]> } : T;

/** Everything a person told the program about one module's charts. */
export type ReadingDocument = Frozen<z.infer<typeof readingDocument>>;
export type ReadingModule = ReadingDocument['module'];
export type ReadingRating = NonNullable<ReadingModule['rated']>[number];
export type ReadingChart = ReadingDocument['charts'][number];
export type ReadingAxis = ReadingChart['x'];
export type ReadingFamily = ReadingChart['family'];
export type ReadingMark = NonNullable<ReadingChart['marks']>[number];
export type ReadingCurve = NonNullable<ReadingChart['curves']>[number];
export type ReadingPrediction = NonNullable<ReadingDocument['predict']>[number];
