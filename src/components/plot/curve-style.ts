import type { PlotCurve } from './types';

export type MarkerShape = 'disc' | 'square' | 'triangle' | 'diamond' | 'cross';

export interface CurveStyle {
  /** A CSS colour, by token. */
  readonly color: string;
  /** stroke-dasharray; empty for a solid line. */
  readonly dash: string;
  readonly marker: MarkerShape;
}

const RAMP = ['var(--curve-1)', 'var(--curve-2)', 'var(--curve-3)'] as const;
const DASHES = ['', '7 3', '2 3', '9 3 2 3', '4 2'] as const;
const MARKERS: readonly MarkerShape[] = ['disc', 'square', 'triangle', 'diamond', 'cross'];

/** How the curve of this index is told from its neighbours: colour, dash and marker, so that none rests on colour alone. */
export const curveStyle = (index: number, tone: PlotCurve['tone'] = 'ramp'): CurveStyle => ({
  color: tone === 'ramp' ? RAMP[index % RAMP.length]! : `var(--${tone})`,
  dash: DASHES[index % DASHES.length]!,
  marker: MARKERS[index % MARKERS.length]!,
});

/** Outlines about the origin, about 7 px across. */
export const MARKER_PATHS: Readonly<Record<MarkerShape, string>> = {
  disc: 'M-3.5,0a3.5,3.5 0 1,0 7,0a3.5,3.5 0 1,0 -7,0Z',
  square: 'M-3,-3h6v6h-6Z',
  triangle: 'M0,-4L3.8,3H-3.8Z',
  diamond: 'M0,-4.4L4.4,0L0,4.4L-4.4,0Z',
  cross: 'M-3.4,-2.2L-2.2,-3.4L0,-1.2L2.2,-3.4L3.4,-2.2L1.2,0L3.4,2.2L2.2,3.4L0,1.2L-2.2,3.4L-3.4,2.2L-1.2,0Z',
};
