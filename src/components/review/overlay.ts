import { arrangeLabels } from '@/components/plot/layout';
import type { Px } from '@/lib/geometry';
import type { CurveEvidence } from './charts';

/** Points of a curve beyond this many are drawn as one line of dots instead of one marker each. */
export const MOST_MARKERS = 60;

/** Height that labels are kept apart for, px: about that of a chart on a phone, so that they stand clear there too. */
const LABEL_HEIGHT = 320;

const round = (value: number) => Math.round(value * 100) / 100;

/** An SVG path through points; with `dots`, a path of no length at each, which a round line cap makes a dot of the line's width. */
export const pathThrough = (points: readonly Px[]): string =>
  points.map(([x, y], at) => `${at === 0 ? 'M' : 'L'}${round(x)} ${round(y)}`).join('');
export const pathOfDots = (points: readonly Px[]): string => points.map(([x, y]) => `M${round(x)} ${round(y)}h0`).join('');

/** A place on the picture in percent of its size. */
export const percentOf = ([x, y]: Px, width: number, height: number) => ({
  x: `${round((100 * x) / width)}%`,
  y: `${round((100 * y) / height)}%`,
});

export interface OverlayLabel {
  readonly text: string;
  readonly style: number;
  readonly x: string;
  readonly y: string;
  readonly side: 'left' | 'right';
}

/** A label at one end of every curve, moved as little as needed to stand clear of the others. */
export function overlayLabels(curves: readonly CurveEvidence[], width: number, height: number): OverlayLabel[] {
  const lines = curves.map((curve) => ({ label: curve.name, points: curve.fitted.length > 0 ? curve.fitted.flat() : curve.points }));
  const { side, labels } = arrangeLabels(
    lines,
    (x) => (100 * x) / width,
    (y) => (LABEL_HEIGHT * y) / height,
    LABEL_HEIGHT,
  );
  return labels.flatMap((label, style) =>
    label ? [{ text: label.text, style, side, x: `${round(label.xPercent)}%`, y: `${round((100 * label.y) / LABEL_HEIGHT)}%` }] : [],
  );
}
