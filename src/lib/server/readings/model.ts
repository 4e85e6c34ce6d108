import type { ModuleRecord } from '@db';
import type { FitNumbers, FittedCurve, ModelAnswer, RatingBeside, Residual } from '@/lib/contracts';
import type { BenchDocument, ChartOrigin } from '@/lib/editor';
import { familyCurves, type DerivedRatings, type ReadingResult } from '@/lib/reading';
import type { SignedInPerson } from '../people';
import { readingFor } from './access';
import { fitDraft, type FittedDraft } from './fit';

/** From numbers of the reading document to those of the draft it was made of. */
function backTo(draft: BenchDocument, origin: readonly ChartOrigin[]) {
  const chartAt = origin.map(({ chart }) => draft.charts.findIndex((candidate) => candidate.id === chart));
  return {
    chart: (chart: number) => chartAt[chart] ?? chart,
    curve: (chart: number, curve: number) => {
      const id = origin[chart]?.curves[curve]?.curve;
      return draft.charts[chartAt[chart] ?? -1]?.curves.findIndex((candidate) => candidate.id === id) ?? curve;
    },
    point: (chart: number, curve: number, point: number) => origin[chart]?.curves[curve]?.points[point] ?? point,
  };
}

function residuals(draft: BenchDocument, { conversion, read }: FittedDraft): Residual[] {
  const at = backTo(draft, conversion.origin);
  return (read?.fit?.residuals ?? []).flatMap((row) => {
    const chart = at.chart(row.chart);
    const curve = at.curve(row.chart, row.curve);
    const point = at.point(row.chart, row.curve, row.point);
    const px = draft.charts[chart]?.curves[curve]?.points[point];
    if (!px) return [];
    const { residual, percentOfRange, standardized, omitted } = row;
    return [{ chart, curve, point, px: [px[0], px[1]] as [number, number], residual, percentOfRange, standardized, omitted }];
  });
}

function family(draft: BenchDocument, { conversion, document, read }: FittedDraft): FittedCurve[] {
  if (!document || !read?.fit) return [];
  const at = backTo(draft, conversion.origin);
  return familyCurves(document, read.frames, read.fit).map(({ chart, curve, value, points }) => ({
    chart: at.chart(chart),
    curve: at.curve(chart, curve),
    value,
    points: points.map(([x, y]) => [x, y] as [number, number]),
  }));
}

const RATINGS = [
  {
    key: 'imaxA',
    unit: 'A',
    of: (derived: DerivedRatings, means: string) => (means === 'mostHeat' ? derived.imaxMostHeat : derived.imaxLargestDeltaT),
  },
  { key: 'vmaxV', unit: 'V', of: (derived: DerivedRatings) => derived.vmaxV },
  { key: 'qmaxW', unit: 'W', of: (derived: DerivedRatings) => derived.qmaxW },
  { key: 'dTmaxK', unit: 'K', of: (derived: DerivedRatings) => derived.dTmaxK },
] as const;

const SAME_SIDE_K = 0.05;

/** Ratings as printed beside what the curves imply at the same hot side; no verdict. */
export function ratingsBeside(module: Pick<ModuleRecord, 'ratings'>, result: ReadingResult | null): RatingBeside[] {
  const derived = result?.model?.derived ?? [];
  const sides = [...new Set([...module.ratings.map((row) => row.hotSideC), ...derived.map((row) => row.hotSideC)])].sort((a, b) => a - b);
  return sides.flatMap((hotSideC) => {
    const printed = module.ratings.find((row) => Math.abs(row.hotSideC - hotSideC) < SAME_SIDE_K);
    const implied = derived.find((row) => Math.abs(row.hotSideC - hotSideC) < SAME_SIDE_K);
    return RATINGS.map(({ key, unit, of }) => {
      const value = implied ? of(implied, printed?.imaxMeans ?? 'notStated') : null;
      return { hotSideC, key, unit, printed: printed?.[key] ?? null, implied: value?.value ?? null, u: value?.u ?? null };
    });
  });
}

function fitNumbers({ read }: FittedDraft): FitNumbers | null {
  if (!read?.fit) return null;
  const { rank, condition, iterations, converged, why } = read.fit;
  return { rank, condition: Number.isFinite(condition) ? condition : null, iterations, converged, why };
}

/** Everything about a fitted draft in the draft's own numbering. */
export function toModelAnswer(draft: BenchDocument, module: Pick<ModuleRecord, 'ratings'>, fitted: FittedDraft): ModelAnswer {
  const result = fitted.read?.result ?? null;
  return {
    result,
    fit: fitNumbers(fitted),
    residuals: residuals(draft, fitted),
    curves: family(draft, fitted),
    ratings: ratingsBeside(module, result),
    problems: fitted.conversion.problems.map(({ chart, text }) => {
      const at = draft.charts.findIndex((candidate) => candidate.id === chart);
      return { chart: at < 0 ? null : at, text };
    }),
  };
}

/** Fits a posted draft of a reading that this person may see; saves nothing. */
export async function modelOf(actor: SignedInPerson, id: number, draft: BenchDocument): Promise<ModelAnswer> {
  const reading = await readingFor(actor, id);
  return toModelAnswer(draft, reading.module, await fitDraft(reading, draft));
}
