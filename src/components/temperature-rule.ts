import { formatWithUnit } from '@/lib/units';
import { spreadLabels } from './plot/spread';
import { textWidth } from './plot/text-width';

export interface RulePoint {
  /** "cold face", "load", "air": lower case. */
  readonly label: string;
  readonly celsius: number;
  readonly role: 'cold' | 'hot' | 'ambient';
}

export interface RuleWidth {
  readonly name: 'least' | 'narrow' | 'medium' | 'wide' | 'full';
  /** Least width at which this drawing is shown, px; wider only gives the labels more room. */
  readonly px: number;
}

/** As the container queries of rule.css switch between them. */
export const RULE_WIDTHS: readonly RuleWidth[] = [
  { name: 'least', px: 240 },
  { name: 'narrow', px: 304 },
  { name: 'medium', px: 480 },
  { name: 'wide', px: 832 },
  { name: 'full', px: 1120 },
];

export interface RuleMark {
  readonly name: string;
  readonly value: string;
  readonly role: RulePoint['role'];
  readonly pointPercent: number;
  readonly labelPercent: number;
  readonly nameY: number;
  readonly valueY: number;
  readonly leaderY: number;
}

export interface RuleLayout {
  readonly height: number;
  readonly lineY: number;
  readonly marks: readonly RuleMark[];
}

const NAME_FONT = 11;
const VALUE_FONT = 15;
const GAP = 10;
/** Share of the line left free at each end, so that a point never sits on its very tip. */
const MARGIN = 0.04;
const ROW = 34;
const LEADER = 12;

const widthOf = (point: RulePoint): number =>
  Math.max(textWidth(point.label, NAME_FONT), textWidth(valueText(point.celsius), VALUE_FONT * 1.06));
const valueText = (celsius: number): string => formatWithUnit(celsius, 'C', { decimals: 1 });

function shareAlong(celsius: number, low: number, high: number): number {
  if (high <= low) return 0.5;
  return MARGIN + (1 - 2 * MARGIN) * Math.min(1, Math.max(0, (celsius - low) / (high - low)));
}

/**
 * Places the points of a rule `width` px wide and their labels above the line, moved as little as keeps them apart;
 * where one row is too short, every other label (in order of temperature) goes below the line.
 */
export function layoutRule(
  points: readonly RulePoint[],
  width: number,
  ends: { min?: number | undefined; max?: number | undefined } = {},
): RuleLayout {
  const sorted = [...points].sort((a, b) => a.celsius - b.celsius);
  const low = ends.min ?? sorted[0]?.celsius ?? 0;
  const high = ends.max ?? sorted.at(-1)?.celsius ?? 1;
  const total = sorted.reduce((sum, point) => sum + widthOf(point) + GAP, -GAP);
  const rows = total > width ? 2 : 1;
  const lineY = ROW + LEADER;
  const marks = sorted.map((point, k) => ({ point, below: rows === 2 && k % 2 === 1, share: shareAlong(point.celsius, low, high) }));
  const place = (below: boolean) => {
    const row = marks.filter((mark) => mark.below === below);
    const middles = spreadLabels(
      row.map(({ point, share }) => ({ at: share * width, size: widthOf(point) })),
      { gap: GAP, min: 0, max: width },
    );
    return row.map(({ point, share }, k) => toMark(point, share, middles[k]! / width, below, lineY));
  };
  return { height: lineY + (rows === 2 ? LEADER + ROW : 8), lineY, marks: [...place(false), ...(rows === 2 ? place(true) : [])] };
}

function toMark(point: RulePoint, share: number, labelShare: number, below: boolean, lineY: number): RuleMark {
  const top = below ? lineY + LEADER : 0;
  return {
    name: point.label,
    value: valueText(point.celsius),
    role: point.role,
    pointPercent: share * 100,
    labelPercent: labelShare * 100,
    nameY: top + 10,
    valueY: top + 27,
    leaderY: below ? top - 1 : ROW - 1,
  };
}

/** The rule in words, coldest first: "Temperatures: cold face 1.9 °C, load 4.0 °C, hot face 44.6 °C." */
export const ruleSummary = (points: readonly RulePoint[]): string =>
  `Temperatures: ${[...points]
    .sort((a, b) => a.celsius - b.celsius)
    .map((point) => `${point.label} ${valueText(point.celsius)}`)
    .join(', ')}.`;
