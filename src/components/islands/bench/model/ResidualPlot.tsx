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

export interface ResidualTableProps {
  readonly groups: readonly CurveResiduals[];
  readonly charts: readonly BenchChart[];
  readonly onPick: (residual: Residual) => void;
}

/** Residuals of every curve of the charts: root mean square in percent of the axis, and how they run along the curve. */
export function ResidualTable({ groups, charts, onPick }: ResidualTableProps) {
  const limit = Math.max(0.5, ...groups.flatMap(({ residuals }) => residuals.map(({ percentOfRange }) => Math.abs(percentOfRange))));
  const reach = formatNumber(limit, { digits: 2 });
  return (
    <table className="table bench-residuals">
      <caption>
        Read minus model, in percent of the axis; the strips reach from −{reach} to {reach}&nbsp;%.
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
      {charts.map((chart, at) => {
        const own = groups.filter((group) => group.chart === at);
        return own.length > 0 && <ChartResiduals key={chart.id} chart={chart} groups={own} limit={limit} onPick={onPick} />;
      })}
    </table>
  );
}

interface ChartResidualsProps extends Pick<ResidualTableProps, 'groups' | 'onPick'> {
  readonly chart: BenchChart;
  readonly limit: number;
}

function ChartResiduals({ chart, groups, limit, onPick }: ChartResidualsProps) {
  const { store } = useTools();
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" colSpan={3}>
          <button type="button" className="bench-link" onClick={() => store.go({ type: 'chart', chart: chart.id })}>
            {chartName(chart)}
          </button>
        </th>
      </tr>
      {groups.map((group) => {
        const curve = chart.curves[group.curve];
        return (
          curve && (
            <tr key={group.curve}>
              <td className="whitespace-nowrap">
                <Swatch style={group.curve} /> {curveName(chart, curve)}
              </td>
              <td className="num">{formatNumber(rms(group.residuals), { decimals: 2 })}</td>
              <td>
                <Strip chart={chart} of={group} limit={limit} onPick={onPick} />
              </td>
            </tr>
          )
        );
      })}
    </tbody>
  );
}
