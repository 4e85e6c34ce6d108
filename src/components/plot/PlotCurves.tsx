import { curveStyle, MARKER_PATHS, type CurveStyle } from './curve-style';
import { CURVE_WIDTH, type EndLabel, type PlotLayout } from './layout';
import type { Pair, PlotData } from './types';

const MARKED = 5;

/** A few points of a curve that carry its marker, evenly along it and away from its ends. */
const markedPoints = (points: readonly Pair[]): readonly Pair[] =>
  points.length < 2 ? points : Array.from({ length: MARKED }, (_, k) => points[Math.round(((k + 0.5) / MARKED) * (points.length - 1))]!);

interface Inside {
  x: number;
  y: number;
}

/** A place in percent across and px down, from which its children count in px. */
const Place = ({ x, y, children }: Inside & { children: React.ReactNode }) => (
  <svg x={`${x}%`} y={y} overflow="visible" width={1} height={1}>
    {children}
  </svg>
);

function Label({ label, side, style }: { label: EndLabel; side: 'left' | 'right'; style: CurveStyle }) {
  const rise = label.y - label.curveY;
  const moved = side === 'right' && Math.abs(rise) > 4;
  return (
    <Place x={label.xPercent} y={label.curveY}>
      {moved && <path d={`M2,0L8,${rise}`} stroke={style.color} fill="none" />}
      <text className="plot-label" x={side === 'right' ? 10 : 6} y={rise + 4}>
        {label.text}
      </text>
    </Place>
  );
}

/** Bands, curves with dash and marker, loose dots, labels and the duty point, from the back to the front. */
export function PlotCurves({ data, layout }: { data: PlotData; layout: PlotLayout }) {
  const { curves, dots = [], duty } = data;
  const { height, x, y } = layout;
  const styles = curves.map((curve, index) => curveStyle(index, curve.tone));
  return (
    <>
      <svg width="100%" height={height} viewBox={`0 0 ${CURVE_WIDTH} ${height}`} preserveAspectRatio="none">
        {layout.bands.map((path, k) => path && <path key={k} className="plot-band" d={path} fill={styles[k]!.color} />)}
        {layout.paths.map((path, k) => (
          <path
            key={k}
            className={curves[k]!.strong ? 'plot-curve plot-strong' : 'plot-curve'}
            d={path}
            stroke={styles[k]!.color}
            strokeDasharray={styles[k]!.dash || undefined}
          />
        ))}
      </svg>
      {curves.map((curve, k) =>
        markedPoints(curve.points).map((point, n) => <Dot key={`${k}.${n}`} x={x(point[0])} y={y(point[1])} style={styles[k]!} />),
      )}
      {dots.map((series, k) =>
        series.points.map((point, n) => <Dot key={`${k}.${n}`} x={x(point[0])} y={y(point[1])} style={styles[k] ?? curveStyle(k)} />),
      )}
      {layout.labels.map((label, k) => label && <Label key={k} label={label} side={layout.labelSide} style={styles[k]!} />)}
      {duty && <Duty x={x(duty.x)} y={y(duty.y)} height={height} label={duty.label} />}
    </>
  );
}

const Dot = ({ x, y, style }: Inside & { style: CurveStyle }) => (
  <Place x={x} y={y}>
    <path className="plot-dot" d={MARKER_PATHS[style.marker]} fill={style.color} />
  </Place>
);

const Duty = ({ x, y, height, label }: Inside & { height: number; label: string }) => (
  <>
    <line className="plot-drop" x1={`${x}%`} x2={`${x}%`} y1={y} y2={height} />
    <line className="plot-drop" x1="0%" x2={`${x}%`} y1={y} y2={y} />
    <Place x={x} y={y}>
      <circle className="plot-duty" r={5} />
      <text className="plot-label" x={x > 70 ? -9 : 9} y={-8} textAnchor={x > 70 ? 'end' : 'start'}>
        {label}
      </text>
    </Place>
  </>
);
