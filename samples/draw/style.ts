import type { Face } from './text';
import type { Layer, XQuantity } from './plan';

export interface Line {
  readonly ink: string;
  readonly width: number;
  readonly dash?: string;
}

/** How a finished drawing becomes a file. */
export type Finish =
  | { readonly file: 'png'; readonly colours?: number; readonly grey?: boolean }
  | { readonly file: 'jpg'; readonly quality: number; readonly scan?: Scan };

/** A page on a scanner: a standard deviation of noise in grey levels, how much darker one edge is, specks in a million pixels. */
export interface Scan {
  readonly noise: number;
  readonly shade: number;
  readonly specks: number;
}

/** One maker's manner of drawing. Lengths in pixels. */
export interface Style {
  readonly width: number;
  readonly height: number;
  readonly margin: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
  readonly paper: string;
  readonly plot?: string;
  readonly frame: Line & { readonly open?: boolean };
  readonly tick: { readonly length: number; readonly minor: number };
  readonly grid: { readonly x?: Line; readonly y?: Line; readonly fine?: Line };
  /** Parts that the fine grid or the small ticks cut each step into. */
  readonly parts: number;
  /** One list of lines for each ink; curves take them in turn. */
  readonly inks: readonly (readonly Line[])[];
  readonly markers?: boolean;
  readonly labels: 'beside' | 'legend';
  readonly face: Face;
  readonly labelFace: Face;
  readonly size: { readonly title: number; readonly axis: number; readonly tick: number; readonly label: number };
  readonly ink: string;
  readonly words: { readonly x: Readonly<Record<XQuantity, string>>; readonly y: Readonly<Record<Layer['answer'], string>> };
  readonly turnDegrees: number;
  readonly finish: Finish;
}
