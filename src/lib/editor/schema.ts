import { z } from 'zod';
import { QUANTITIES, RATING_KEYS, UNITS } from '@/lib/reading';
import type { BenchDocument } from './document';

/** Bounds of a draft, so that one row stays of a size that a screen can draw and a server can take. */
export const LIMITS = { charts: 40, marks: 200, curves: 60, points: 20_000, through: 200, title: 120, note: 4000 } as const;

const number = z.number().min(-1e12).max(1e12);
const pixel = z.number().min(-1e6).max(1e6);
const px = z.tuple([pixel, pixel]).readonly();
const id = z.string().regex(/^[cmk][0-9]{1,9}$/);
const quantity = z.enum(QUANTITIES).nullable();
const unit = z.enum(UNITS).nullable();
const of = z.enum(RATING_KEYS).optional();
const axis = z.strictObject({ quantity, unit, scale: z.enum(['linear', 'log']), of });
const list = <T extends z.ZodType>(element: T, max: number) => z.array(element).max(max).readonly();
const distinctIds = (things: readonly { readonly id: string }[]) => new Set(things.map((thing) => thing.id)).size === things.length;

const mark = z.strictObject({ id, px, x: number.nullable(), y: number.nullable() });

const curve = z
  .strictObject({
    id,
    value: number.nullable(),
    by: z.enum(['hand', 'followed', 'path']),
    points: list(px, LIMITS.points),
    omitted: list(z.int().min(0), LIMITS.points),
    start: px.optional(),
    through: list(px, LIMITS.through).optional(),
  })
  .refine(({ points, omitted }) => omitted.every((index, at) => index < points.length && (at === 0 || index > (omitted[at - 1] ?? -1))), {
    path: ['omitted'],
    error: 'Left-out points must be indices of points of the curve, ascending.',
  });

const chart = z.strictObject({
  id,
  pictureId: z.int().positive(),
  pixelsSha256: z.string().regex(/^[0-9a-f]{64}$/),
  width: z.int().positive(),
  height: z.int().positive(),
  title: z.string().max(LIMITS.title),
  x: axis,
  y: axis,
  family: axis.omit({ scale: true }),
  side: z.strictObject({ kind: z.enum(['hot', 'cold']), celsius: z.number().min(-273.15).max(2000).nullable() }),
  frame: z.enum(['upright', 'turned', 'perspective']).nullable(),
  marks: list(mark, LIMITS.marks).refine(distinctIds, 'Two marks have the same id.'),
  curves: list(curve, LIMITS.curves).refine(distinctIds, 'Two curves have the same id.'),
});

/** Shape of a draft, version 1: half-finished things are allowed, unknown keys are not. */
export const benchDocument: z.ZodType<BenchDocument, BenchDocument> = z.strictObject({
  format: z.literal('couplet.bench'),
  version: z.literal(1),
  charts: list(chart, LIMITS.charts).refine(distinctIds, 'Two charts have the same id.'),
  model: z.strictObject({ form: z.enum(['auto', 'constant']), use: z.tuple([z.literal('curves')]).readonly() }),
  note: z.string().max(LIMITS.note).optional(),
});
