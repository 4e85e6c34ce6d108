import { formatNumber, NOT_STATED } from '@/lib/units';
import { axisLabel, valueAt, type PlotLayout } from './layout';
import type { PlotData } from './types';

const DIGITS = 3;

const Value = ({ value }: { value: number | null }) =>
  value === null ? (
    <>
      <span aria-hidden="true">{NOT_STATED}</span>
      <span className="sr-only">outside the curve</span>
    </>
  ) : (
    <>{formatNumber(value, { digits: DIGITS })}</>
  );

/** The same curves as numbers, at the round values of the horizontal axis. */
export function PlotTable({ title, data, layout }: { title: string; data: PlotData; layout: PlotLayout }) {
  const { curves, x, y } = data;
  if (curves.length === 0) return null;
  return (
    <details className="plot-table mt-2">
      <summary className="muted">Table of values</summary>
      <div className="table-scroll">
        <table className="table">
          <caption>
            {title}: {axisLabel(y)}
          </caption>
          <thead>
            <tr>
              <th scope="col" className="num">
                {axisLabel(x)}
              </th>
              {curves.map((curve, k) => (
                <th key={k} scope="col" className="num">
                  {curve.label}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {layout.xTicks.map((tick) => (
              <tr key={tick.value}>
                <th scope="row" className="num">
                  {tick.text}
                </th>
                {curves.map((curve, k) => (
                  <td key={k} className="num">
                    <Value value={valueAt(curve.points, tick.value)} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
