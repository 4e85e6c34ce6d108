/** A place on the picture in continuous pixels: origin at its top left corner, x to the right, y down; pixel [row][column] has its centre at (column + 0.5, row + 0.5). */
export type Px = readonly [number, number];

/** How an axis runs: `linear`, or `log` (base 10, positive values only). Either may run either way. */
export type Scale = 'linear' | 'log';

/** The scale of each axis of a chart. */
export interface Scales {
  readonly x: Scale;
  readonly y: Scale;
}

/** upright: a scale and an origin for each axis (4 unknowns); turned: and one angle (5); perspective: a photograph of a flat page (8). */
export type FrameKind = 'upright' | 'turned' | 'perspective';

/** A pixel whose x value, y value or both are known. Only x says: this pixel lies somewhere on the line x = value. */
export interface Mark {
  readonly px: Px;
  readonly x?: number;
  readonly y?: number;
}

/**
 * The mapping between pixels and the values of a chart; plain data, survives JSON.
 * With (dx, dy) = px − origin and (s, t) = the values, log10 of them on a log axis, `parameters` are
 * - upright `[a, b, c, d]`: dx = a + b·s, dy = c + d·t
 * - turned `[a, b, c, d, θ]`: cos θ·dx + sin θ·dy = a + b·s, −sin θ·dx + cos θ·dy = c + d·t, θ in radians
 * - perspective `[g11, g12, g13, g21, g22, g23, g31, g32]`: s = (g11·dx + g12·dy + g13) / w, t = (g21·dx + g22·dy + g23) / w, w = 1 + g31·dx + g32·dy
 */
export interface Frame {
  readonly kind: FrameKind;
  readonly scales: Scales;
  /** Mean place of the marks. */
  readonly origin: Px;
  readonly parameters: readonly number[];
  /** Covariance of the parameters, from `markUncertaintyPx`. */
  readonly covariance: readonly (readonly number[])[];
  /** Standard uncertainty of a mark along each value, px: 0.5, or the residual where that is larger. */
  readonly markUncertaintyPx: number;
  /** Root mean square distance of the marks from their value lines, px; null when there are no more values than unknowns. */
  readonly residualPx: number | null;
  /** The same in the units of each axis; null with `residualPx`. */
  readonly residualInUnits: { readonly x: number | null; readonly y: number | null };
}

/** Either a frame, or a sentence that says which mark is missing or wrong and what to do; `at` is the index of the mark meant. */
export type FrameOutcome =
  { readonly ok: true; readonly frame: Frame } | { readonly ok: false; readonly message: string; readonly at?: number };
