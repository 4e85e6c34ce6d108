import { formatWithUnit } from '@/lib/units';
import { valueAt, type PlotLayout } from './layout';
import type { PlotData } from './types';

interface Props {
  data: PlotData;
  layout: PlotLayout;
  at: number | null;
  onAt: (value: number | null) => void;
}

const DIGITS = 3;

/** Reads all curves at one place: by the pointer over the plot, or by this slider with keys and taps. */
export function PlotReader({ data, layout, at, onAt }: Props) {
  const [from = 0, to = 1] = layout.x.domain();
  const [low, high] = [Math.min(from, to), Math.max(from, to)];
  const { x, y, curves } = data;
  const here = (value: number) => `${x.symbol ?? x.name} ${formatWithUnit(value, x.unit, { digits: DIGITS })}`;
  const read =
    at === null
      ? []
      : curves.map((curve) => ({ label: curve.label, value: valueAt(curve.points, at) })).filter(({ value }) => value !== null);
  return (
    <div className="plot-reader">
      <input
        type="range"
        aria-label={`Read the curves at ${x.name}`}
        min={low}
        max={high}
        step={(high - low) / 200}
        value={at ?? low}
        aria-valuetext={here(at ?? low)}
        onChange={(event) => onAt(Number(event.target.value))}
        onKeyDown={(event) => event.key === 'Escape' && onAt(null)}
      />
      <output className="plot-read">
        {at === null ? (
          <span className="muted">Point at the plot or move the slider to read the curves.</span>
        ) : (
          <>
            <b>{here(at)}</b>
            {read.map(({ label, value }) => (
              <span key={label}>
                {' · '}
                {label} <b>{formatWithUnit(value, y.unit, { digits: DIGITS })}</b>
              </span>
            ))}
          </>
        )}
      </output>
    </div>
  );
}
