import type { Px } from '@/lib/geometry';

/** A picture as an array of pixels: rows from the top, three bytes (sRGB) a pixel. Element [row][column] has its centre at (column + 0.5, row + 0.5). */
export interface Raster {
  readonly width: number;
  readonly height: number;
  readonly rgb: Uint8Array | Uint8ClampedArray;
}

/** A rectangle in pixels that a curve does not leave. */
export interface Bounds {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** A stretch of a curve that has no points, and why: what hides the line there. Dash gaps are summed in one entry with `count`. */
export interface Gap {
  readonly from: Px;
  readonly to: Px;
  readonly why: 'label' | 'crossing' | 'marker' | 'dash';
  readonly count?: number;
}

/** A place where following is not sure of itself, with a sentence for the person who looks. */
export interface Doubt {
  readonly px: Px;
  readonly why: 'crossing' | 'gap' | 'neighbour' | 'faint' | 'end';
  readonly text: string;
}

/** A curve followed to both ends, or a sentence on why there is none. Points are in order, at most 2 px apart along ink. */
export type Followed =
  | { readonly ok: true; readonly points: readonly Px[]; readonly gaps: readonly Gap[]; readonly doubts: readonly Doubt[] }
  | { readonly ok: false; readonly message: string };

/** Along which axis neighbouring points of a stretch are one pixel apart: columns for shallow lines, rows for steep ones. */
export type Mode = 'columns' | 'rows';

/** One step along a curve: where the line was measured, or that it was not. */
export interface Step {
  readonly mode: Mode;
  /** Centre of the column or row, px. */
  readonly t: number;
  /** Measured centre across, px; where the line was not measured, where it was expected. */
  readonly v: number;
  /** Clean: the whole cross-section was seen. Part: something lies over part of it. None: no ink. */
  readonly seen: 'clean' | 'part' | 'none';
}
