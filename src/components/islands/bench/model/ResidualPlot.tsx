import { scaleLinear } from 'd3-scale';
import { chartName, curveName, type BenchChart } from '@/lib/editor';
import type { Residual } from '@/lib/contracts';
import { formatNumber } from '@/lib/units';
import { useTools } from '../state/tools';
import { Swatch } from '../points/Swatch';
import type { CurveResiduals } from './outliers';

const WIDTH = 190;
const HEIGHT = 34;

/** Residuals of one curve along it, each a button that leads to its point. `limit` is the half height in percent of the axis. */
function Strip({
  chart,
  of,
  limit,
  onPick,
}: {
  chart: BenchChart;
  of: CurveResiduals;
  limit: number;
  onPick: (residual: Residual) => void;
}) {
  const across = scaleLinear([0, chart.width], [4, WIDTH - 4]);
  const up = scaleLinear([-limit, limit], [HEIGHT - 4, 4]).clamp(true);
  return (
    <svg className="bench-strip" viewBox={`0 0 ${WIDTH} ${HEIGHT}`} width={WIDTH} height={HEIGHT} aria-hidden="true">
      <path d={`M0 ${HEIGHT / 2}H${WIDTH}`} stroke="var(--control)" />
      {of.residuals.map((residual) => (
        <circle
          key={residual.point}
          cx={across(residual.px[0])}
          cy={up(residual.percentOfRange)}
          r={residual.omitted ? 1.5 : 2.5}
          fill={residual.omitted ? 'none' : `var(--curve-${(of.curve % 3) + 1})`}
          stroke={`var(--curve-${(of.curve % 3) + 1})`}
          onClick={() => onPick(residual)}
        />
      ))}
    </svg>
  );
}

const rms = (residuals: readonly Residual[]): number => {
  const used = residuals.filter(({ omitted }) => !omitted);
  return Math.sqrt(used.reduce((sum, { percentOfRange }) => sum + percentOfRange ** 2, 0) / Math.max(1, used.length));
};

/** Residuals of every curve of the charts: root mean square in percent of the axis, and how they run along the curve. */
export function ResidualTable({
  groups,
  charts,
  onPick,
}: {
  groups: readonly CurveResiduals[];
  charts: readonly BenchChart[];
  onPick: (residual: Residual) => void;
}) {
  const { store } = useTools();
  const limit = Math.max(0.5, ...groups.flatMap(({ residuals }) => residuals.map(({ percentOfRange }) => Math.abs(percentOfRange))));
  return (
    <table className="table bench-residuals">
      <caption>
        Read minus model, in percent of the axis; the strips reach from −{formatNumber(limit, { digits: 2 })} to{' '}
        {formatNumber(limit, { digits: 2 })}&nbsp;%.
      </caption>
      <thead>
        <tr>
          <th scope="col">Curve</th>
          <th scope="col" className="num">
            rms / %
          </th>
          <th scope="col">Along the curve</th>
        </tr>
      </thead>
      <tbody>
        {groups.map((group) => {
          const chart = charts[group.chart];
          const curve = chart?.curves[group.curve];
          if (!chart || !curve) return null;
          return (
            <tr key={`${group.chart}/${group.curve}`}>
              <td>
                <button
                  type="button"
                  className="bench-link"
                  onClick={() => store.go({ type: 'chart', chart: chart.id })}
                  aria-label={`Show ${curveName(chart, curve)} of ${chartName(chart)}`}
                >
                  <Swatch style={group.curve} /> {curveName(chart, curve)}
                </button>
                <br />
                <small>{chartName(chart)}</small>
              </td>
              <td className="num">{formatNumber(rms(group.residuals), { decimals: 2 })}</td>
              <td>
                <Strip chart={chart} of={group} limit={limit} onPick={onPick} />
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
