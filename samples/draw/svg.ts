import type { Px } from '@/lib/geometry';
import type { Box } from './spots';
import type { Line } from './style';

const trim = (value: number) => String(Math.round(value * 1000) / 1000);

const pen = ({ ink, width, dash }: Line) =>
  `fill="none" stroke="${ink}" stroke-width="${width}"${dash ? ` stroke-dasharray="${dash}"` : ''} stroke-linejoin="round"`;

export const polyline = (points: readonly Px[], line: Line): string =>
  `<path d="M${points.map(([x, y]) => `${trim(x)} ${trim(y)}`).join('L')}" ${pen(line)}/>`;

/** Many straight strokes of one pen in one path. */
export const strokes = (segments: readonly (readonly [Px, Px])[], line: Line): string =>
  segments.length === 0
    ? ''
    : `<path d="${segments.map(([[a, b], [c, d]]) => `M${trim(a)} ${trim(b)}L${trim(c)} ${trim(d)}`).join('')}" ${pen(line)}/>`;

export const filled = ({ left, top, right, bottom }: Box, fill: string, line?: Line): string =>
  `<rect x="${trim(left)}" y="${trim(top)}" width="${trim(right - left)}" height="${trim(bottom - top)}" ${line ? pen(line).replace('fill="none"', `fill="${fill}"`) : `fill="${fill}"`}/>`;

/** A small filled mark on a curve: a disc, a square, a diamond or a triangle. */
export function blob([x, y]: Px, kind: number, ink: string): string {
  const r = 4;
  const shapes = [
    `M${trim(x - r)} ${trim(y)}A${r} ${r} 0 1 0 ${trim(x + r)} ${trim(y)}A${r} ${r} 0 1 0 ${trim(x - r)} ${trim(y)}Z`,
    `M${trim(x - r)} ${trim(y - r)}h${2 * r}v${2 * r}h${-2 * r}Z`,
    `M${trim(x)} ${trim(y - r * 1.3)}L${trim(x + r * 1.3)} ${trim(y)}L${trim(x)} ${trim(y + r * 1.3)}L${trim(x - r * 1.3)} ${trim(y)}Z`,
    `M${trim(x)} ${trim(y - r * 1.2)}L${trim(x + r * 1.2)} ${trim(y + r)}L${trim(x - r * 1.2)} ${trim(y + r)}Z`,
  ];
  return `<path d="${shapes[kind % shapes.length]}" fill="${ink}"/>`;
}

/** A whole picture, laid on its paper and turned about its middle. */
export const page = (width: number, height: number, paper: string, turnDegrees: number, content: string): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}">` +
  `<rect width="${width}" height="${height}" fill="${paper}"/>` +
  `<g transform="rotate(${turnDegrees} ${width / 2} ${height / 2})">${content}</g></svg>`;

/** Where a point of the page stands once the page is turned. */
export function turned([x, y]: Px, width: number, height: number, degrees: number): Px {
  const angle = (degrees * Math.PI) / 180;
  const [dx, dy] = [x - width / 2, y - height / 2];
  return [width / 2 + dx * Math.cos(angle) - dy * Math.sin(angle), height / 2 + dx * Math.sin(angle) + dy * Math.cos(angle)];
}
