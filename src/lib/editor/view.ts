import type { Px } from '@/lib/geometry';
import type { BenchChart, BenchDocument } from './document';
import { findChart } from './document';
import type { Selection, Session } from './session';
import { placeOfSelection, sameSelection } from './session';

/** A mark as it is drawn: numbered from 1 in the order of the list. */
export interface SceneMark {
  readonly id: string;
  readonly number: number;
  readonly px: Px;
  readonly known: 'x' | 'y' | 'both' | 'none';
  readonly selected: boolean;
}

/** A curve as it is drawn: `style` counts the curves of the chart from 0. */
export interface SceneCurve {
  readonly id: string;
  readonly value: number | null;
  readonly style: number;
  readonly active: boolean;
  readonly points: readonly Px[];
  readonly omitted: readonly number[];
}

/** Everything the stage draws over the picture, in source pixels. */
export interface Scene {
  readonly chart: BenchChart | null;
  readonly marks: readonly SceneMark[];
  readonly curves: readonly SceneCurve[];
  readonly selected: Px | null;
}

const known = (x: number | null, y: number | null): SceneMark['known'] => {
  if (x !== null && y !== null) return 'both';
  return x !== null ? 'x' : y !== null ? 'y' : 'none';
};

/** What to draw for a document and a session: marks from the frame station on, curves from the curves station on. */
export const view = (document: BenchDocument, session: Session): Scene => {
  const chart = findChart(document, session.chart);
  const shows = (...stations: Session['station'][]) => chart !== null && stations.includes(session.station);
  return {
    chart,
    marks: shows('frame', 'curves')
      ? (chart?.marks ?? []).map(({ id, px, x, y }, index) => ({
          id,
          number: index + 1,
          px,
          known: known(x, y),
          selected: sameSelection(session.selection, { kind: 'mark', mark: id }),
        }))
      : [],
    curves: shows('frame', 'curves', 'model')
      ? (chart?.curves ?? []).map(({ id, value, points, omitted }, style) => ({
          id,
          value,
          style,
          active: session.station === 'curves' && id === session.curve,
          points,
          omitted,
        }))
      : [],
    selected: shows('frame', 'curves', 'model') ? placeOfSelection(chart, session.selection) : null,
  };
};

interface Candidate {
  readonly selection: Selection;
  readonly px: Px;
}

const candidates = (chart: BenchChart, session: Session): readonly Candidate[] => {
  if (session.station === 'frame') return chart.marks.map(({ id, px }) => ({ selection: { kind: 'mark', mark: id }, px }));
  if (session.station !== 'curves' && session.station !== 'model') return [];
  return chart.curves.flatMap((curve) => curve.points.map((px, point) => ({ selection: { kind: 'point', curve: curve.id, point }, px })));
};

/**
 * What can be picked out nearest to a place, within `radius` source pixels; null when nothing is. A point of the curve in
 * hand wins over a point of another that is nearer by less than a third of the radius.
 */
export const handleAt = (chart: BenchChart | null, session: Session, px: Px, radius: number): Selection | null => {
  if (!chart) return null;
  const cost = ({ selection, px: at }: Candidate) => {
    const away = Math.hypot(at[0] - px[0], at[1] - px[1]);
    const elsewhere = selection.kind === 'point' && session.curve !== null && selection.curve !== session.curve;
    return { away, cost: away + (elsewhere ? radius / 3 : 0) };
  };
  let best: { readonly selection: Selection; readonly cost: number } | null = null;
  for (const candidate of candidates(chart, session)) {
    const { away, cost: total } = cost(candidate);
    if (away <= radius && (!best || total < best.cost)) best = { selection: candidate.selection, cost: total };
  }
  return best?.selection ?? null;
};
