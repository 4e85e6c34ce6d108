import { z } from 'zod';
import { MODEL_FORMS } from '@/lib/module';
import type { RatingKey } from '@/lib/reading';
import { QUANTITIES, unitsOf, type Unit } from '@/lib/units';
import { LIMITS, type BenchDocument } from './document';

const distinctIds = (things: readonly { readonly id: string }[]) => new Set(things.map((thing) => thing.id)).size === things.length;

const list = <T extends z.ZodType>(element: T, max: number) => z.array(element).max(max).readonly();

const RATINGS = { imaxA: true, vmaxV: true, qmaxW: true, dTmaxK: true } satisfies Record<RatingKey, true>;

const buildChart = () => {
  const number = z.number().min(-1e12).max(1e12);
  const pixel = z.number().min(-1e6).max(1e6);
  const px = z.tuple([pixel, pixel]).readonly();
  const id = z.string().regex(/^[cmk][0-9]{1,9}$/);
  const units: readonly Unit[] = [...new Set<Unit>([...QUANTITIES.flatMap(unitsOf), '1', '%'])];
  const quantity = z.enum(QUANTITIES).nullable();
  const unit = z.enum(units).nullable();
  const of = z.enum(Object.keys(RATINGS) as RatingKey[]).optional();
  const axis = z.strictObject({ quantity, unit, scale: z.enum(['linear', 'log']), of });

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

  return z.strictObject({
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
};

const buildDocument = (): z.ZodType<BenchDocument, BenchDocument> =>
  z.strictObject({
    format: z.literal('couplet.bench'),
    version: z.literal(1),
    charts: list(buildChart(), LIMITS.charts).refine(distinctIds, 'Two charts have the same id.'),
    model: z.strictObject({ form: z.enum(['auto', ...MODEL_FORMS]), use: z.tuple([z.literal('curves')]).readonly() }),
    note: z.string().max(LIMITS.note).optional(),
  });

/**
 * Shape of a draft, version 1: half-finished things are allowed, unknown keys are not. Marked pure, so that a bundle that
 * does not check drafts carries no validation.
 */
export const benchDocument = /* @__PURE__ */ buildDocument();
