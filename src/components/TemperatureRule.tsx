import { useId } from 'react';
import { layoutRule, RULE_WIDTHS, ruleSummary, type RulePoint, type RuleWidth } from './temperature-rule';

const WIDTH_CLASS = { least: 'rule-least', narrow: 'rule-narrow', medium: 'rule-medium', wide: 'rule-wide', full: 'rule-full' } as const;
const ROLE_CLASS = { cold: 'rule-cold', hot: 'rule-hot', ambient: undefined } as const;

export interface TemperatureRuleProps {
  points: readonly RulePoint[];
  /** A sentence under the line: "ΔT over the module 42.7 K". */
  caption?: string;
  /** Ends of the line, °C; from the points when absent. */
  min?: number;
  max?: number;
}

/** Real temperatures on one thin line from cold to hot. Drawn for five widths, of which the page shows one; complete without a script. */
export function TemperatureRule({ points, caption, min, max }: TemperatureRuleProps) {
  return (
    <div className="rule">
      <div role="img" aria-label={ruleSummary(points)}>
        {RULE_WIDTHS.map((width) => (
          <Rule key={width.name} width={width} points={points} min={min} max={max} />
        ))}
      </div>
      {caption && <p className="rule-caption">{caption}</p>}
    </div>
  );
}

function Rule({ width, points, min, max }: { width: RuleWidth; points: readonly RulePoint[]; min?: number; max?: number }) {
  const id = useId();
  const { lineY, height, marks } = layoutRule(points, width.px, { min, max });
  return (
    <svg className={WIDTH_CLASS[width.name]} height={height} aria-hidden="true">
      <linearGradient id={id}>
        <stop offset="0" stopColor="var(--cold)" />
        <stop offset="0.5" stopColor="var(--middle)" />
        <stop offset="1" stopColor="var(--hot)" />
      </linearGradient>
      <rect x="0" y={lineY - 1.5} width="100%" height={3} rx={1.5} fill={`url(#${id})`} />
      {marks.map((mark, k) => (
        <g key={k} className={ROLE_CLASS[mark.role]}>
          <line className="rule-leader" x1={`${mark.labelPercent}%`} x2={`${mark.pointPercent}%`} y1={mark.leaderY} y2={lineY} />
          <circle className="rule-point" cx={`${mark.pointPercent}%`} cy={lineY} r={4.5} />
          <text className="rule-name" x={`${mark.labelPercent}%`} y={mark.nameY} textAnchor="middle">
            {mark.name}
          </text>
          <text className="rule-value" x={`${mark.labelPercent}%`} y={mark.valueY} textAnchor="middle">
            {mark.value}
          </text>
        </g>
      ))}
    </svg>
  );
}
