import { frameOf, type BenchChart, type Station } from '@/lib/editor';
import { quantityName, unitSymbol } from '@/lib/units';

const axisWords = (chart: BenchChart, axis: 'x' | 'y'): string => {
  const { quantity, unit, scale } = chart[axis];
  if (!quantity) return `${axis} axis not stated`;
  const symbol = unit ? unitSymbol(unit) : '';
  return `${axis} axis ${quantityName(quantity)}${symbol && ` in ${symbol}`}, ${scale === 'log' ? 'logarithmic' : 'linear'}`;
};

const frameWords = (chart: BenchChart): string => {
  const outcome = frameOf(chart);
  return outcome.ok ? `${outcome.frame.kind} frame from ${chart.marks.length} marks` : 'no frame yet';
};

const KEYS: Readonly<Record<Station, string>> = {
  chart: 'Plus and minus zoom, 0 shows the whole picture.',
  frame: 'Arrow keys move the cross-hairs or the mark picked out, Enter places a mark, brackets step through the marks.',
  curves: 'Arrow keys move the cross-hairs or the point picked out, Enter places a point, brackets step through the points.',
  model: 'Brackets step through the points.',
  'hand-in': '',
};

/** What the stage shows, in words, for who cannot see it. */
export const stageSummary = (chart: BenchChart | null, station: Station): string => {
  if (!chart) return 'No chart yet.';
  const points = chart.curves.reduce((sum, curve) => sum + curve.points.length, 0);
  return `${axisWords(chart, 'x')}; ${axisWords(chart, 'y')}; ${frameWords(chart)}; ${chart.curves.length} curves with ${points} points. ${KEYS[station]} Question mark lists all keys. Tab leaves the picture.`;
};
