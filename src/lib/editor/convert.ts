import type { ReadingAxis, ReadingChart, ReadingCurve, ReadingDocument, ReadingModule } from '@/lib/reading';
import type { BenchAxis, BenchChart, BenchCurve, BenchDocument, BenchFamily, BenchPicture } from './document';
import { emptyChart, emptyDocument } from './document';
import type { ChartProblem } from './state';
import { isFinished, problemsOf } from './state';

/** Where a chart and its curves of a reading document stand in the draft. */
export interface ChartOrigin {
  readonly chart: string;
  readonly curves: readonly { readonly curve: string; readonly points: readonly number[] }[];
}

/**
 * A draft as a reading document: its finished charts, and for each the ids and point indices it came from. `document` is
 * null when no chart is finished; `problems` says what keeps the others out.
 */
export interface Conversion {
  readonly document: ReadingDocument | null;
  readonly origin: readonly ChartOrigin[];
  readonly problems: readonly ChartProblem[];
}

const usedPoints = (curve: BenchCurve): readonly number[] => {
  const omitted = new Set(curve.omitted);
  return curve.points.map((_, index) => index).filter((index) => !omitted.has(index));
};

const toCurve = (curve: BenchCurve): ReadingCurve => {
  const leftOut = curve.omitted.flatMap((index) => (curve.points[index] ? [curve.points[index]] : []));
  return {
    value: curve.value ?? NaN,
    ...(curve.start && { start: curve.start }),
    ...(curve.through && { through: curve.through }),
    points: usedPoints(curve).flatMap((index) => (curve.points[index] ? [curve.points[index]] : [])),
    by: curve.by,
    ...(leftOut.length > 0 && { note: { leftOut } }),
  };
};

const shown = ({ quantity, unit, of }: BenchFamily) => ({ quantity: quantity ?? 'I', unit: unit ?? '1', ...(of && { of }) });
const toAxis = (axis: BenchAxis): ReadingAxis => ({ ...shown(axis), scale: axis.scale });

const toChart = (chart: BenchChart, image: string): ReadingChart => ({
  image,
  x: toAxis(chart.x),
  y: toAxis(chart.y),
  family: shown(chart.family),
  [chart.side.kind === 'hot' ? 'hotSideC' : 'coldSideC']: chart.side.celsius,
  ...(chart.frame && { frame: chart.frame }),
  marks: chart.marks.map(({ px, x, y }) => ({ px, ...(x !== null && { x }), ...(y !== null && { y }) })),
  curves: chart.curves.map(toCurve),
  ...(chart.title && { note: { title: chart.title } }),
});

/**
 * The reading document of a draft. Points that are left out of the fit stand under the curve's `note`, titles under the
 * chart's, so that they come back with {@link fromReadingDocument}.
 *
 * @param module identity and ratings, which live with the module and not in the draft
 * @param imageName the file name a picture goes by in the document
 */
export const toReadingDocument = (bench: BenchDocument, module: ReadingModule, imageName: (pictureId: number) => string): Conversion => {
  const finished = bench.charts.filter(isFinished);
  const origin = finished.map((chart) => ({
    chart: chart.id,
    curves: chart.curves.map((curve) => ({ curve: curve.id, points: usedPoints(curve) })),
  }));
  const document: ReadingDocument = {
    format: 'couplet.reading',
    version: 1,
    module,
    charts: finished.map((chart) => toChart(chart, imageName(chart.pictureId))),
    model: { form: bench.model.form, use: [...bench.model.use] },
    ...(bench.note && { note: bench.note }),
  };
  return { document: finished.length > 0 ? document : null, origin, problems: bench.charts.flatMap(problemsOf) };
};

/** A draft, or a sentence that says why the document cannot be taken. */
export type Imported = { readonly ok: true; readonly document: BenchDocument } | { readonly ok: false; readonly message: string };

const isPx = (value: unknown): value is readonly [number, number] =>
  Array.isArray(value) && value.length === 2 && value.every((n) => typeof n === 'number' && Number.isFinite(n));

const noted = (note: unknown, key: string): unknown =>
  typeof note === 'object' && note !== null && key in note ? (note as Readonly<Record<string, unknown>>)[key] : undefined;

const leftOutOf = (note: unknown): readonly (readonly [number, number])[] => {
  const list = noted(note, 'leftOut');
  return Array.isArray(list) ? list.filter(isPx) : [];
};

const fromCurve = (curve: ReadingCurve, id: string): BenchCurve => {
  const used = curve.points ?? [];
  const leftOut = leftOutOf(curve.note);
  return {
    id,
    value: curve.value,
    by: curve.by ?? 'hand',
    points: [...used, ...leftOut],
    omitted: leftOut.map((_, index) => used.length + index),
    ...(curve.start && { start: curve.start }),
    ...(curve.through && { through: curve.through }),
  };
};

const fromAxis = ({ quantity, unit, scale, of }: ReadingAxis): BenchAxis => ({
  quantity,
  unit,
  scale: scale ?? 'linear',
  ...(of && { of }),
});

/** Gives out ids that are unique in the document being made. */
const counter = () => {
  const next = { c: 0, m: 0, k: 0 };
  return (prefix: keyof typeof next) => `${prefix}${++next[prefix]}`;
};

const fromChart = (chart: ReadingChart, picture: BenchPicture, id: ReturnType<typeof counter>): BenchChart => {
  const title = noted(chart.note, 'title');
  const { quantity, unit, of } = chart.family;
  return {
    ...emptyChart(id('c'), picture),
    title: typeof title === 'string' ? title : '',
    x: fromAxis(chart.x),
    y: fromAxis(chart.y),
    family: { quantity, unit, ...(of && { of }) },
    side: { kind: chart.hotSideC === undefined ? 'cold' : 'hot', celsius: chart.hotSideC ?? chart.coldSideC ?? null },
    frame: chart.frame ?? null,
    marks: (chart.marks ?? []).map(({ px, x, y }) => ({ id: id('m'), px, x: x ?? null, y: y ?? null })),
    curves: (chart.curves ?? []).map((curve) => fromCurve(curve, id('k'))),
  };
};

/**
 * The draft of a reading document. Left-out points come back at the end of their curve.
 *
 * @param picture the picture an image name stands for among those of the reading's sheets, or null
 */
export const fromReadingDocument = (document: ReadingDocument, picture: (image: string) => BenchPicture | null): Imported => {
  const id = counter();
  const charts: BenchChart[] = [];
  for (const chart of document.charts) {
    const found = picture(chart.image);
    if (!found) {
      return {
        ok: false,
        message: `The reading was made on “${chart.image}”, and no page of these sheets has that picture: upload it to the sheet first.`,
      };
    }
    charts.push(fromChart(chart, found, id));
  }
  const form = document.model?.form ?? 'auto';
  const note = typeof document.note === 'string' && document.note ? { note: document.note } : {};
  return { ok: true, document: { ...emptyDocument(), charts, model: { form, use: ['curves'] }, ...note } };
};
