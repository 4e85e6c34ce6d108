export type Pair = readonly [x: number, y: number];

export interface PlotAxis {
  /** "heat pumped": lower case, in the terms of the product. */
  readonly name: string;
  /** "Qc", where there is one. */
  readonly symbol?: string;
  /** Unit as @/lib/units spells it; "1" for a plain ratio. */
  readonly unit: string;
  /** From and to; a reversed pair turns the axis round. From the data when absent. */
  readonly domain?: Pair;
  /** Keep zero in sight when the domain comes from the data; true unless said otherwise. */
  readonly zero?: boolean;
}

export interface PlotCurve {
  /** What stands at the end of the curve: "2.1 A". */
  readonly label: string;
  readonly points: readonly Pair[];
  /** Lower and upper limit at each x, drawn as a tint behind the curve. */
  readonly band?: readonly (readonly [x: number, low: number, high: number])[];
  /** The violet ramp unless the curve belongs to a compared module. */
  readonly tone?: 'ramp' | 'plum' | 'ink';
  /** Drawn heavier than the rest. */
  readonly strong?: boolean;
}

/** Points that are not joined: measured, read or residual. Their marks follow the curve of the same index. */
export interface PlotDots {
  readonly label: string;
  readonly points: readonly Pair[];
}

export interface PlotDuty {
  readonly x: number;
  readonly y: number;
  readonly label: string;
}

export interface PlotData {
  readonly x: PlotAxis;
  readonly y: PlotAxis;
  readonly curves: readonly PlotCurve[];
  readonly dots?: readonly PlotDots[];
  readonly duty?: PlotDuty | null;
}
