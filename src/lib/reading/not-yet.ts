import type { ReadingChart, ReadingDocument } from './document';
import type { Refusal } from './refused';

function ofChart(chart: ReadingChart, path: string): Refusal | null {
  if (!chart.marks) {
    return { path: `${path}.marks`, message: 'This version does not find the frame of a chart by itself: give the marks of the chart.' };
  }
  return chart.curves
    ? null
    : {
        path: `${path}.curves`,
        message: 'This version does not find the curves of a chart by itself: give a pixel on each curve to start from, or its points.',
      };
}

/** The first thing a valid document asks that this version cannot do yet; null when it can do everything. */
export function notYet({ charts, model }: ReadingDocument): Refusal | null {
  const other = model?.use?.findIndex((use) => use !== 'curves') ?? -1;
  if (other >= 0) {
    return { path: `model.use[${other}]`, message: `This version fits curves only, not ${model?.use?.[other]}: set use to ["curves"].` };
  }
  for (const [at, chart] of charts.entries()) {
    const refusal = ofChart(chart, `charts[${at}]`);
    if (refusal) return refusal;
  }
  return null;
}
