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
  const across = Math.ceil(picture.width / BLOCK);
  const down = Math.ceil(picture.height / BLOCK);
  const values = new Float64Array(across * down * 3);
  const isKnown = new Uint8Array(across * down);
  /** Where the values of a block are; blocks beyond the edge are those at the edge. */
  const block = (x: number, y: number): number => {
    const column = x < 0 ? 0 : x >= across ? across - 1 : x;
    const row = y < 0 ? 0 : y >= down ? down - 1 : y;
    const at = row * across + column;
    if (isKnown[at] === 0) {
      values.set(medianOf(picture, column * BLOCK, row * BLOCK), at * 3);
      isKnown[at] = 1;
    }
    return at * 3;
  };
  const at = (column: number, row: number, out: Float64Array): void => {
    const x = (column + 0.5) / BLOCK - 0.5;
    const y = (row + 0.5) / BLOCK - 0.5;
    const left = Math.floor(x);
    const top = Math.floor(y);
    const a = block(left, top);
    const b = block(left + 1, top);
    const c = block(left, top + 1);
    const d = block(left + 1, top + 1);
    const fx = x - left;
    const fy = y - top;
    for (let k = 0; k < 3; k++) {
      out[k] = (values[a + k]! * (1 - fx) + values[b + k]! * fx) * (1 - fy) + (values[c + k]! * (1 - fx) + values[d + k]! * fx) * fy;
    }
  };
  return { at };
}
