import { z } from 'zod';
import { DUTY_FIELDS, MISS_KINDS, type Duty } from '@/lib/duty';
import { parseNumber } from '@/lib/units';
import { rowId } from './common';

const fieldOf = (key: keyof Duty) => DUTY_FIELDS.find((field) => field.key === key)!;

/** A number within the limits of its field in the form, with the same sentences. */
const limited = (key: keyof Duty) =>
  z.number(`${fieldOf(key).label} must be a number, like 2.5.`).superRefine((value, context) => {
    const parsed = parseNumber(String(value), { ...fieldOf(key), unit: fieldOf(key).unit });
    if (!parsed.ok) context.addIssue({ code: 'custom', message: parsed.message });
  });

export const MOST_ROWS = 1000;

export const dutyBody = z.strictObject({
  heatW: limited('heatW'),
  coldFaceC: limited('coldFaceC'),
  hotFaceC: limited('hotFaceC'),
  maxCurrentA: limited('maxCurrentA').optional(),
  maxVoltageV: limited('maxVoltageV').optional(),
  ambientC: limited('ambientC').optional().describe('air around the cold face, for the dew point'),
  humidityPercent: limited('humidityPercent').optional(),
  rows: z.int().min(1).max(MOST_ROWS).default(100).describe('most matches, and most misses, to answer with'),
});
export type DutyBody = z.input<typeof dutyBody>;

const doubtful = z.strictObject({
  value: z.number(),
  u: z.number().nullable().describe('standard uncertainty of the reading'),
  tolerance: z.number().nullable().describe('how far off a module at the low end of its tolerance is'),
});
export type DoubtfulView = z.infer<typeof doubtful>;

const part = z.strictObject({ id: rowId, name: z.string(), vendor: z.string(), grade: z.enum(['measured', 'curves', 'ratings']) });

export const dutyMatch = z.strictObject({
  module: part,
  current: doubtful,
  voltageV: z.number(),
  powerW: z.number(),
  cop: doubtful.nullable().describe('null where no power is taken up'),
  heat: doubtful,
  heatRejectedW: z.number(),
  shareOfImax: z.number().describe('of the current of the largest ΔT at this hot face'),
  reserveW: z.number(),
  inside: z.boolean(),
  notes: z.array(z.strictObject({ kind: z.string(), text: z.string() })),
});
export type DutyMatchView = z.infer<typeof dutyMatch>;

export const dutyMiss = z.strictObject({
  module: part,
  reasons: z.array(z.strictObject({ kind: z.enum(MISS_KINDS), text: z.string() })),
  reach: z.strictObject({ heatW: z.number(), currentA: z.number() }).describe('most heat within the limits'),
  shortfall: z.number(),
});
export type DutyMissView = z.infer<typeof dutyMiss>;

export const dutyAnswer = z.strictObject({
  candidates: z.int(),
  matchCount: z.int(),
  missCount: z.int(),
  missCounts: z.record(z.enum(MISS_KINDS), z.int()),
  matches: z.array(dutyMatch).describe('best COP first'),
  misses: z.array(dutyMiss).describe('closest first'),
  condensation: z
    .strictObject({ kind: z.enum(['dew', 'frost']), celsius: z.number(), reserveK: z.number() })
    .nullable()
    .describe('dew or frost point of the air and the reserve of the cold face; null while air or humidity is not stated'),
});
export type DutyAnswer = z.infer<typeof dutyAnswer>;
