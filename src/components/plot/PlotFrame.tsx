import type { PlotLayout } from './layout';

/** Grid, edges and numbers of the two axes. */
export function PlotFrame({ layout, xLabel }: { layout: PlotLayout; xLabel: string }) {
  const { height, xTicks, yTicks } = layout;
  return (
    <g>
      {xTicks.map(({ value, text, at, minor }) => (
        <g key={value} className={minor ? 'plot-minor' : undefined}>
          <line className="plot-grid" x1={`${at}%`} x2={`${at}%`} y1={0} y2={height} />
          <text x={`${at}%`} y={height + 16} textAnchor="middle">
            {text}
          </text>
        </g>
      ))}
      {yTicks.map(({ value, text, at }) => (
        <g key={value}>
          <line className="plot-grid" x1="0%" x2="100%" y1={at} y2={at} />
          <text x={-8} y={at + 4} textAnchor="end">
            {text}
          </text>
        </g>
      ))}
      <line className="plot-edge" x1="0%" x2="100%" y1={height} y2={height} />
      <line className="plot-edge" x1="0%" x2="0%" y1={0} y2={height} />
      <text x="50%" y={height + 34} textAnchor="middle" fontSize={12}>
        {xLabel}
      </text>
    </g>
  );
}
