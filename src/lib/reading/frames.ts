import { fitFrame, type Frame, type Mark } from '@/lib/geometry';
import type { ReadingChart, ReadingDocument } from './document';
import type { Refusal } from './refused';

/** The marks of a chart as its frame takes them. */
export const marksOf = (chart: ReadingChart): readonly Mark[] => (chart.marks ?? []).map(({ px, x, y }) => ({ px, x, y }));

/** The frame of every chart, in order, or the first chart whose marks make none. */
export type FramesOutcome = { readonly ok: true; readonly frames: readonly Frame[] } | ({ readonly ok: false } & Refusal);

/** Fits the frame of every chart of a document to its marks. */
export function framesOf(document: ReadingDocument): FramesOutcome {
  const frames: Frame[] = [];
  for (const [at, chart] of document.charts.entries()) {
    const scales = { x: chart.x.scale ?? 'linear', y: chart.y.scale ?? 'linear' };
    const outcome = fitFrame(marksOf(chart), scales, chart.frame);
    if (!outcome.ok) {
      const mark = outcome.at === undefined ? '' : `[${outcome.at}]`;
      return { ok: false, path: `charts[${at}].marks${mark}`, message: outcome.message };
    }
    frames.push(outcome.frame);
  }
  return { ok: true, frames };
}
