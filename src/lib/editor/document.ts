import type { FrameKind, Px, Scale } from '@/lib/geometry';
import type { ModelForm } from '@/lib/module';
import type { RatingKey } from '@/lib/reading';
import type { Quantity, Unit } from '@/lib/units';

/** What one axis shows. `unit` is `1` or `%` where the axis is normalised `of` a rating. */
export interface BenchAxis {
  readonly quantity: Quantity | null;
  readonly unit: Unit | null;
  readonly scale: Scale;
  readonly of?: RatingKey | undefined;
}

/** What tells one curve of a chart from the next. */
export interface BenchFamily {
  readonly quantity: Quantity | null;
  readonly unit: Unit | null;
  readonly of?: RatingKey | undefined;
}

/** The face whose temperature the chart keeps, in °C; null while it is not stated. */
export interface BenchSide {
  readonly kind: 'hot' | 'cold';
  readonly celsius: number | null;
}

/** A pixel of the source image whose x, y or both values are known, in the units of the axes. */
export interface BenchMark {
  readonly id: string;
  readonly px: Px;
  readonly x: number | null;
  readonly y: number | null;
}

/** How the points of a curve came about. */
export type CurveOrigin = 'hand' | 'followed' | 'path';

/**
 * One line of a chart: its family value, in the family's unit, and its points in source pixels, in order along the line.
 * `omitted` lists the indices of points that stay in sight but are left out of the fit, ascending.
 */
export interface BenchCurve {
  readonly id: string;
  readonly value: number | null;
  readonly by: CurveOrigin;
  readonly points: readonly Px[];
  readonly omitted: readonly number[];
  readonly start?: Px | undefined;
  readonly through?: readonly Px[] | undefined;
}

/** One picture with one pair of axes. `width` and `height` are pixels of the intake picture. */
export interface BenchChart {
  readonly id: string;
  readonly pictureId: number;
  readonly pixelsSha256: string;
  readonly width: number;
  readonly height: number;
  readonly title: string;
  readonly x: BenchAxis;
  readonly y: BenchAxis;
  readonly family: BenchFamily;
  readonly side: BenchSide;
  /** A forced kind of frame, or null to let the marks decide. */
  readonly frame: FrameKind | null;
  readonly marks: readonly BenchMark[];
  readonly curves: readonly BenchCurve[];
}

/** The draft of a reading. Marks and pixel points are stored; values are always derived. Identity and ratings live with the module. */
export interface BenchDocument {
  readonly format: 'couplet.bench';
  readonly version: 1;
  readonly charts: readonly BenchChart[];
  readonly model: { readonly form: 'auto' | ModelForm; readonly use: readonly ['curves'] };
  readonly note?: string | undefined;
}

/** Bounds of a draft, so that one row stays of a size that a screen can draw and a server can take. */
export const LIMITS = { charts: 40, marks: 200, curves: 60, points: 20_000, through: 200, title: 120, note: 4000 } as const;

/** A page picture that a chart may be read from. */
export interface BenchPicture {
  readonly id: number;
  readonly pixelsSha256: string;
  readonly width: number;
  readonly height: number;
}

/** A draft in which nothing has been read yet. */
export const emptyDocument = (): BenchDocument => ({
  format: 'couplet.bench',
  version: 1,
  charts: [],
  model: { form: 'auto', use: ['curves'] },
});

/** A chart of a picture before anything about it has been told. */
export const emptyChart = (id: string, picture: BenchPicture): BenchChart => ({
  id,
  pictureId: picture.id,
  pixelsSha256: picture.pixelsSha256,
  width: picture.width,
  height: picture.height,
  title: '',
  x: { quantity: null, unit: null, scale: 'linear' },
  y: { quantity: null, unit: null, scale: 'linear' },
  family: { quantity: null, unit: null },
  side: { kind: 'hot', celsius: null },
  frame: null,
  marks: [],
  curves: [],
});

/** A curve without points; its value is typed later or with it. */
export const emptyCurve = (id: string, value: number | null = null): BenchCurve => ({
  id,
  value,
  by: 'hand',
  points: [],
  omitted: [],
});

/** The next unused id with a prefix: `m1`, `m2`, … , one above the highest number in use anywhere in the document. */
export const nextId = (document: BenchDocument, prefix: 'c' | 'm' | 'k'): string => {
  const ids = document.charts.flatMap((chart) => [chart.id, ...chart.marks.map((m) => m.id), ...chart.curves.map((c) => c.id)]);
  const numbers = ids.filter((id) => id.startsWith(prefix)).map((id) => Number(id.slice(1)));
  return `${prefix}${1 + Math.max(0, ...numbers.filter(Number.isInteger))}`;
};

/** The chart with this id, or null. */
export const findChart = (document: BenchDocument, id: string | null): BenchChart | null =>
  document.charts.find((chart) => chart.id === id) ?? null;

/** The curve with this id, or null. */
export const findCurve = (chart: BenchChart | null, id: string | null): BenchCurve | null =>
  chart?.curves.find((curve) => curve.id === id) ?? null;

/** Pixel positions are kept to a thousandth of a source pixel. */
export const roundPx = ([x, y]: Px): Px => [Math.round(x * 1000) / 1000 + 0, Math.round(y * 1000) / 1000 + 0];
