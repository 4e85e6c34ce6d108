import type { Raster } from './types';

/** Side of the blocks that the ground is measured in, px. */
const BLOCK = 32;

/** The unprinted ground of a picture, which may be tinted and unevenly lit. */
export interface Paper {
  /** Writes the ground's red, green and blue at a pixel into `out`. */
  readonly at: (column: number, row: number, out: Float64Array) => void;
}

/** Median of each channel over a block: lines and letters cover less than half of it. */
function medianOf({ width, height, rgb }: Raster, left: number, top: number): Float64Array {
  const counts = [new Uint32Array(256), new Uint32Array(256), new Uint32Array(256)] as const;
  const [right, bottom] = [Math.min(width, left + BLOCK), Math.min(height, top + BLOCK)];
  for (let row = top; row < bottom; row++) {
    for (let at = (row * width + left) * 3; at < (row * width + right) * 3; at += 3) {
      counts[0][rgb[at]!]!++;
      counts[1][rgb[at + 1]!]!++;
      counts[2][rgb[at + 2]!]!++;
    }
  }
  const half = ((right - left) * (bottom - top)) / 2;
  return Float64Array.from(counts, (count) => {
    let [value, below] = [0, count[0]!];
    while (below < half) below += count[++value]!;
    return value;
  });
}

/** The ground of a picture, measured block by block where it is asked for, linear between block centres. */
export function paperOf(picture: Raster): Paper {
  const [across, down] = [Math.ceil(picture.width / BLOCK), Math.ceil(picture.height / BLOCK)];
  const blocks: (Float64Array | undefined)[] = new Array(across * down);
  const block = (x: number, y: number): Float64Array => {
    const [column, row] = [Math.min(across - 1, Math.max(0, x)), Math.min(down - 1, Math.max(0, y))];
    return (blocks[row * across + column] ??= medianOf(picture, column * BLOCK, row * BLOCK));
  };
  const at = (column: number, row: number, out: Float64Array): void => {
    const [x, y] = [(column + 0.5) / BLOCK - 0.5, (row + 0.5) / BLOCK - 0.5];
    const [left, top] = [Math.floor(x), Math.floor(y)];
    const [fx, fy] = [x - left, y - top];
    const [a, b, c, d] = [block(left, top), block(left + 1, top), block(left, top + 1), block(left + 1, top + 1)];
    for (let k = 0; k < 3; k++) out[k] = (a[k]! * (1 - fx) + b[k]! * fx) * (1 - fy) + (c[k]! * (1 - fx) + d[k]! * fx) * fy;
  };
  return { at };
}
