import type { Px } from '@/lib/geometry';
import { linearAxis, logAxis, type Axis } from './axes';
import { curvesOf, type DataCurve } from './evaluate';
import type { Layer, Made, Panel } from './plan';
import { drawGround } from './panel-ground';
import { drawLabels } from './panel-labels';
import type { Box } from './spots';
import type { Style } from './style';
import { blob, polyline } from './svg';

/** A curve as it was drawn: its family value and its line in pixels of the page. */
export interface DrawnCurve {
  readonly value: number;
  readonly line: readonly Px[];
}

/** A layer as it was drawn, with the axes that it is read on. */
export interface DrawnLayer {
  readonly layer: Layer;
  readonly x: Axis;
  readonly y: Axis;
  readonly curves: readonly DrawnCurve[];
}

export interface DrawnPanel {
  readonly panel: Panel;
  readonly svg: string;
  readonly layers: readonly DrawnLayer[];
}

const extreme = (curves: readonly DataCurve[], at: 0 | 1, pick: (...values: number[]) => number) =>
  pick(...curves.flatMap((curve) => curve.points.map((point) => point[at])));

/** A COP climbs without end where the current vanishes: makers cut it off. */
const CUT = { COP: 4, Qc: Infinity, V: Infinity } as const;

function xAxisOf({ x }: Panel, curves: readonly DataCurve[], style: Style, box: Box): Axis {
  const ends = [box.left, box.right] as const;
  const low = x === 'Tc' ? extreme(curves, 0, Math.min) : 0;
  return linearAxis(low, extreme(curves, 0, Math.max), 7, style.parts, ends);
}

function yAxisOf(layers: readonly Layer[], curves: readonly DataCurve[], style: Style, box: Box): Axis {
  const ends = [box.bottom, box.top] as const;
  const first = layers[0];
  const high = Math.min(extreme(curves, 1, Math.max), first ? CUT[first.answer] : Infinity);
  return first?.scale === 'log' ? logAxis(0.1, high, ends) : linearAxis(0, high, 6, style.parts, ends);
}

/** The part of a curve inside the axis, in pixels; where it leaves, the line ends on the frame. */
function inFrame({ points }: DataCurve, x: Axis, y: Axis): readonly Px[] {
  const within = (value: number) => value >= y.min && value <= y.max;
  const line: Px[] = [];
  points.forEach(([px, py], at) => {
    const before = points[at - 1];
    if (before && within(before[1]) !== within(py)) {
      const edge = Math.max(before[1], py) > y.max ? y.max : y.min;
      const share = (edge - before[1]) / (py - before[1]);
      line.push([x.place(before[0] + share * (px - before[0])), y.place(edge)]);
    }
    if (within(py)) line.push([x.place(px), y.place(py)]);
  });
  return line;
}

const MARKED = [0.06, 0.22, 0.38, 0.54, 0.7, 0.86, 0.98];

function drawCurves({ layer, curves }: DrawnLayer, style: Style): string {
  const lines = style.inks[layer.ink ?? 0] ?? [];
  return curves
    .map(({ line }, index) => {
      const stroke = lines[index % lines.length] ?? { ink: style.ink, width: 1.5 };
      const marks = style.markers ? MARKED.map((share) => line[Math.round(share * (line.length - 1))] ?? [0, 0]) : [];
      return polyline(line, stroke) + marks.map((px) => blob(px as Px, index, stroke.ink)).join('');
    })
    .join('');
}

/** Draws one pair of axes with its families of curves into a box of the page. */
export function drawPanel(made: Made, panel: Panel, style: Style, box: Box): DrawnPanel {
  const data = panel.layers.map((layer) => curvesOf(made, panel, layer));
  const x = xAxisOf(panel, data.flat(), style, box);
  const axisFor = (side: Layer['side']) => {
    const here = panel.layers.map((layer, at) => ({ layer, at })).filter(({ layer }) => (layer.side ?? 'left') === side);
    return yAxisOf(
      here.map(({ layer }) => layer),
      here.flatMap(({ at }) => data[at] ?? []),
      style,
      box,
    );
  };
  const layers = panel.layers.map((layer, at): DrawnLayer => {
    const y = axisFor(layer.side ?? 'left');
    return { layer, x, y, curves: (data[at] ?? []).map((curve) => ({ value: curve.value, line: inFrame(curve, x, y) })) };
  });
  const curves = layers.map((layer) => drawCurves(layer, style)).join('');
  return { panel, layers, svg: drawGround(panel, layers, style, box) + curves + drawLabels(layers, style, box) };
}
