import { DASHES, SHAPES } from '../stage/ink';

const COLOURS = ['var(--curve-1)', 'var(--curve-2)', 'var(--curve-3)'] as const;

const MARKERS = {
  circle: <circle cx="18" cy="7" r="3.5" />,
  square: <rect x="14.8" y="3.8" width="6.4" height="6.4" />,
  diamond: <path d="M18 2.6 22.4 7 18 11.4 13.6 7Z" />,
  triangle: <path d="M18 3 22 10.2H14Z" />,
  cross: <path d="M14.8 3.8 21.2 10.2M14.8 10.2 21.2 3.8" />,
} as const;

/** Line and marker of a curve as they stand on the picture, in the colours of the theme. */
export function Swatch({ style }: { style: number }) {
  const colour = COLOURS[style % COLOURS.length];
  const dash = DASHES[style % DASHES.length];
  const shape = SHAPES[style % SHAPES.length] ?? 'circle';
  return (
    <svg width="36" height="14" viewBox="0 0 36 14" fill="none" stroke={colour} aria-hidden="true">
      <path d="M1 7H35" strokeWidth="2" strokeDasharray={dash?.join(' ')} />
      <g fill="var(--surface)" strokeWidth="1.5">
        {MARKERS[shape]}
      </g>
    </svg>
  );
}
