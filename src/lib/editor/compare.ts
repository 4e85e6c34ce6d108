import { same } from './change';
import type { BenchChart, BenchDocument } from './document';

/** What one version of a draft holds of a chart. */
export interface ChartTally {
  readonly marks: number;
  readonly curves: number;
  readonly points: number;
}

/** One chart of two versions side by side; null where a version does not have it. */
export interface ChartDifference {
  readonly id: string;
  readonly mine: ChartTally | null;
  readonly theirs: ChartTally | null;
  readonly same: boolean;
}

/** How much of a chart has been read. */
export const tallyOf = (chart: BenchChart): ChartTally => ({
  marks: chart.marks.length,
  curves: chart.curves.length,
  points: chart.curves.reduce((sum, curve) => sum + curve.points.length, 0),
});

/** Whether two drafts say the same. */
export const sameDocument = (a: BenchDocument, b: BenchDocument): boolean => same(a, b);

/** Two versions of a draft, chart by chart: first those of mine, in my order, then those only the other has. */
export const compareDocuments = (mine: BenchDocument, theirs: BenchDocument): readonly ChartDifference[] => {
  const ids = [...new Set([...mine.charts, ...theirs.charts].map((chart) => chart.id))];
  return ids.map((id) => {
    const [a, b] = [mine, theirs].map((document) => document.charts.find((chart) => chart.id === id));
    return { id, mine: a ? tallyOf(a) : null, theirs: b ? tallyOf(b) : null, same: same(a, b) };
  });
};
