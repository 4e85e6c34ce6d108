import { useId, useMemo, useState, useSyncExternalStore, type ReactNode } from 'react';
import { axisLabel, layoutPlot, type PlotLayout } from './layout';
import { PlotCurves } from './PlotCurves';
import { PlotFrame } from './PlotFrame';
import { PlotReader } from './PlotReader';
import { PlotTable } from './PlotTable';
import { summary } from './summary';
import type { PlotData } from './types';

export interface PlotProps extends PlotData {
  /** What the plot shows; spoken, and shown unless the page already says it. */
  title: string;
  hideTitle?: boolean;
  /** Height of the area between the axes, px. */
  height?: number;
  /** A sentence below: what the bands mean, what the dots are. */
  note?: ReactNode;
  /** A table of the same values, folded up; true unless the page shows one already. */
  table?: boolean;
}

const hydrated = () => true;
const onServer = () => false;
const never = () => () => {};

/** A family of curves over two axes. Complete without a script; with one, the curves can be read off at any place. */
export function Plot({ title, hideTitle = false, height, note, table = true, x, y, curves, dots, duty }: PlotProps) {
  const id = useId();
  const data: PlotData = useMemo(() => ({ x, y, curves, dots, duty }), [x, y, curves, dots, duty]);
  const layout = useMemo(() => layoutPlot(data, height), [data, height]);
  const [at, setAt] = useState<number | null>(null);
  const alive = useSyncExternalStore(never, hydrated, onServer);
  return (
    <figure className="plot" aria-labelledby={`${id}-title`}>
      <figcaption id={`${id}-title`} className={hideTitle ? 'sr-only' : 'mb-1 font-semibold'}>
        {title}
      </figcaption>
      <div className="plot-axis" aria-hidden="true">
        {axisLabel(y)}
      </div>
      <div style={{ paddingLeft: layout.leftGutter, paddingRight: layout.rightGutter }}>
        <div className="plot-area" onPointerMove={(event) => setAt(valueUnder(event, layout))} onPointerLeave={() => setAt(null)}>
          <svg height={layout.height} role="img" aria-label={summary(data, layout)}>
            <PlotFrame layout={layout} xLabel={axisLabel(x)} />
            <PlotCurves data={data} layout={layout} />
            {at !== null && <line className="plot-hair" x1={`${layout.x(at)}%`} x2={`${layout.x(at)}%`} y1={0} y2={layout.height} />}
          </svg>
        </div>
        <div className="plot-foot" />
        {alive && <PlotReader data={data} layout={layout} at={at} onAt={setAt} />}
      </div>
      {note && <p className="hint mt-1">{note}</p>}
      {table && <PlotTable title={title} data={data} layout={layout} />}
    </figure>
  );
}

function valueUnder(event: React.PointerEvent<HTMLDivElement>, layout: PlotLayout): number {
  const box = event.currentTarget.getBoundingClientRect();
  const percent = ((event.clientX - box.left) / box.width) * 100;
  return layout.x.invert(Math.max(0, Math.min(100, percent)));
}
