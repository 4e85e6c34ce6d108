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

/** The candidate with the least cost within reach, asked for one after the other; made for being asked at every move of a pointer. */
const nearest = (px: Px, radius: number) => {
  let best: Selection | null = null;
  let least = Infinity;
  return {
    offer: (at: Px, handicap: number, selection: () => Selection) => {
      const away = Math.hypot(at[0] - px[0], at[1] - px[1]);
      if (away > radius || away + handicap >= least) return;
      least = away + handicap;
      best = selection();
    },
    best: (): Selection | null => best,
  };
};

/**
 * What can be picked out nearest to a place, within `radius` source pixels; null when nothing is. A point of the curve in
 * hand wins over a point of another that is nearer by less than a third of the radius.
 */
export const handleAt = (chart: BenchChart | null, session: Session, px: Px, radius: number): Selection | null => {
  const search = nearest(px, radius);
  if (chart && session.station === 'frame') {
    for (const { id, px: at } of chart.marks) search.offer(at, 0, () => ({ kind: 'mark', mark: id }));
  }
  if (chart && (session.station === 'curves' || session.station === 'model')) {
    for (const { id, points } of chart.curves) {
      const handicap = session.curve === null || session.curve === id ? 0 : radius / 3;
      points.forEach((at, point) => search.offer(at, handicap, () => ({ kind: 'point', curve: id, point })));
    }
  }
  return search.best();
};
