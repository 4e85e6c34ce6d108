import type { Px } from '@/lib/geometry';

/** An upright box of pixels. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export const around = ([x, y]: Px, width: number, height: number): Box => ({
  left: x - width / 2,
  top: y - height / 2,
  right: x + width / 2,
  bottom: y + height / 2,
});

const beyond = (low: number, value: number, high: number) => Math.max(low - value, 0, value - high);
const distance = (box: Box, [x, y]: Px) => Math.hypot(beyond(box.left, x, box.right), beyond(box.top, y, box.bottom));

const apart = (a: Box, b: Box) =>
  Math.hypot(Math.max(a.left - b.right, 0, b.left - a.right), Math.max(a.top - b.bottom, 0, b.top - a.bottom));

const inside = (box: Box, frame: Box) =>
  Math.min(box.left - frame.left, frame.right - box.right, box.top - frame.top, frame.bottom - box.bottom);

/** How far a box is from all lines, boxes and the frame that it should keep clear of. */
export const clearance = (box: Box, lines: readonly (readonly Px[])[], boxes: readonly Box[], frame: Box): number =>
  Math.min(
    inside(box, frame),
    ...lines.map((line) => Math.min(...line.map((px) => distance(box, px)))),
    ...boxes.map((other) => apart(box, other)),
  );

const SHARES = [0.16, 0.24, 0.1, 0.32, 0.4, 0.5, 0.6, 0.7, 0.8, 0.88, 0.95];

/** The box beside a line, so far from it that its nearest corner keeps the gap. */
function beside(line: readonly Px[], at: number, over: boolean, width: number, height: number, gap: number): Box {
  const [a, b] = [line[Math.max(0, at - 2)] ?? [0, 0], line[Math.min(line.length - 1, at + 2)] ?? [0, 0]];
  const length = Math.hypot(b[0] - a[0], b[1] - a[1]) || 1;
  const [along, up] = [(b[0] - a[0]) / length, (b[1] - a[1]) / length];
  const normal = along >= 0 ? ([up, -along] as const) : ([-up, along] as const);
  const off = (Math.abs(normal[0]) * width + Math.abs(normal[1]) * height) / 2 + gap;
  const [x, y] = line[at] ?? [0, 0];
  const sign = over ? 1 : -1;
  return around([x + sign * normal[0] * off, y + sign * normal[1] * off], width, height);
}

/** A place beside each line for its label: the first that keeps clear of everything, or else the clearest. */
export function spotsBeside(
  lines: readonly (readonly Px[])[],
  sizes: readonly (readonly [number, number])[],
  frame: Box,
  taken: readonly Box[],
): Box[] {
  const placed: Box[] = [];
  lines.forEach((line, index) => {
    const [width, height] = sizes[index] ?? [0, 0];
    const candidates = SHARES.flatMap((share) =>
      [true, false].map((over) => beside(line, Math.round(share * (line.length - 1)), over, width, height, 4)),
    );
    const rated = candidates.map((box) => ({ box, clear: clearance(box, lines, [...taken, ...placed], frame) }));
    const best = rated.find(({ clear }) => clear >= 3.2) ?? rated.reduce((a, b) => (b.clear > a.clear ? b : a));
    placed.push(best.box);
  });
  return placed;
}

/** The corner of the frame that keeps a box of this size clearest of the lines. */
export function clearestCorner(lines: readonly (readonly Px[])[], width: number, height: number, frame: Box): Box {
  const inset = 10;
  const [left, right] = [frame.left + inset + width / 2, frame.right - inset - width / 2];
  const [top, bottom] = [frame.top + inset + height / 2, frame.bottom - inset - height / 2];
  const middle = (frame.left + frame.right) / 2;
  const centres: readonly Px[] = [
    [right, top],
    [left, bottom],
    [left, top],
    [right, bottom],
    [middle, bottom],
    [middle, top],
  ];
  const boxes = centres.map((centre) => around(centre, width, height));
  return boxes.reduce((a, b) => (clearance(b, lines, [], frame) > clearance(a, lines, [], frame) ? b : a));
}
