import { areDistinct, type InkVector } from './palette';
import type { Paper } from './paper';
import type { Mode, Raster } from './types';

/** A cross-section of a line: how much of each pixel its ink covers, and how far that can be trusted. */
export interface Profile {
  /** Index (row or column) of the first pixel. */
  first: number;
  length: number;
  /** Share of the pixel covered by the line's own ink, about 0 to 1. */
  readonly cover: Float64Array;
  /** 1 where the pixel is understood; less where another ink or a ground like the ink hides it. */
  readonly trust: Float64Array;
}

/** Reads cross-sections of lines of one ink. */
export interface InkReader {
  readonly ink: InkVector;
  /** Fills a profile across the line at column (or row) `line`, over pixels `first` … `first + length − 1`; `reach` is half the line's thickness across, `slope` its dv/dt. */
  readonly read: (mode: Mode, line: number, first: number, length: number, reach: number, slope: number) => Profile;
}

const MOST = 128;
/** A ground is straight when it goes on over this many pixels at both sides of the line. */
const RUN = 6;

/**
 * A reader of one ink over its local ground. A pixel p on ground g holds p = a·ink + (1 − a)·g, so that a = (g − p)·(g − ink)/|g − ink|²: exact for
 * area antialiasing in sRGB bytes. The ground is the paper, or a grid line where the same colour goes on at both sides of the line.
 * `strayness` is how far the ink's own pixels stray from its colour (bytes). What that leaves unexplained is divided between this ink and the one other ink of the palette that explains it best.
 */
export function inkReader(
  { width, height, rgb }: Raster,
  paper: Paper,
  palette: readonly InkVector[],
  ink: InkVector,
  strayness: number,
): InkReader {
  const size = Math.hypot(...ink);
  const [i0, i1, i2] = ink;
  const others = [...palette, [255, 255, 255] as InkVector].filter((other) => areDistinct(other, ink));
  const strange = Math.max(18, 0.1 * size, Math.min(0.45 * size, 1.8 * strayness));
  const ground = new Float64Array(3);
  const d = new Float64Array(3);
  const left = new Float64Array(3);
  const right = new Float64Array(3);
  const under = new Float64Array(3);
  const column = new Float64Array(3);
  const profile: Profile = { first: 0, length: 0, cover: new Float64Array(MOST), trust: new Float64Array(MOST) };

  /** Paper minus pixel. */
  const difference = (x: number, y: number, out: Float64Array): boolean => {
    if (x < 0 || y < 0 || x >= width || y >= height) return false;
    paper.at(x, y, ground);
    const at = (y * width + x) * 3;
    out[0] = ground[0]! - rgb[at]!;
    out[1] = ground[1]! - rgb[at + 1]!;
    out[2] = ground[2]! - rgb[at + 2]!;
    return true;
  };
  const one = new Float64Array(3);
  /** Mean difference over a straight run of pixels that all have ink; false where one has none. */
  const run = (x: number, y: number, dx: number, dy: number, out: Float64Array): boolean => {
    out.fill(0);
    for (let k = 0; k < RUN; k++) {
      if (!difference(x + k * dx, y + k * dy, one)) return false;
      if (Math.hypot(one[0]!, one[1]!, one[2]!) < 14) return false;
      for (let c = 0; c < 3; c++) out[c] = out[c]! + one[c]! / RUN;
    }
    return true;
  };
  /** The straight ink at both sides of a pixel along (dx, dy), beyond `reach`; false where it does not go on. */
  const straight = (x: number, y: number, dx: number, dy: number, reach: number, out: Float64Array): boolean => {
    if (!run(x - reach * dx, y - reach * dy, -dx, -dy, left) || !run(x + reach * dx, y + reach * dy, dx, dy, right)) return false;
    let apart = 0;
    for (let c = 0; c < 3; c++) {
      out[c] = (left[c]! + right[c]!) / 2;
      apart += (left[c]! - right[c]!) ** 2;
    }
    return Math.sqrt(apart) < 60;
  };

  /** Divides a difference between the ink and one other; cover into profile at k. */
  const divide = (k: number, u0: number, u1: number, u2: number): void => {
    const uu = u0 * u0 + u1 * u1 + u2 * u2;
    const [d0, d1, d2] = [d[0]!, d[1]!, d[2]!];
    const du = d0 * u0 + d1 * u1 + d2 * u2;
    let cover = du / uu;
    let trust = 1;
    const rest = Math.hypot(d0 - cover * u0, d1 - cover * u1, d2 - cover * u2);
    if (rest > strange) {
      let best = rest;
      for (const [v0, v1, v2] of others) {
        const [vv, uv, dv] = [v0 * v0 + v1 * v1 + v2 * v2, u0 * v0 + u1 * v1 + u2 * v2, d0 * v0 + d1 * v1 + d2 * v2];
        const det = uu * vv - uv * uv;
        let a = (du * vv - dv * uv) / det;
        let b = (dv * uu - du * uv) / det;
        if (b < 0) continue;
        if (a < 0) {
          a = 0;
          b = dv / vv;
        }
        const left = Math.hypot(d0 - a * u0 - b * v0, d1 - a * u1 - b * v1, d2 - a * u2 - b * v2);
        if (left < best) {
          best = left;
          cover = a;
          trust = b < 0.08 ? 1 : a + b > 0.9 ? (b > a ? 0.15 : 0.5) : 0.8;
        }
      }
    }
    profile.cover[k] = Math.max(-0.2, Math.min(1.3, cover));
    profile.trust[k] = trust;
  };

  const read = (mode: Mode, line: number, first: number, length: number, reach: number, slope: number): Profile => {
    const count = Math.min(MOST, length);
    profile.first = first;
    profile.length = count;
    const isColumns = mode === 'columns';
    const steep = Math.abs(slope);
    const beyond = Math.ceil(reach / Math.max(steep, 0.05)) + 3;
    const across = Math.ceil(reach + steep) + 4;
    const [x0, y0] = isColumns ? [line, Math.round(first + count / 2)] : [Math.round(first + count / 2), line];
    const middle = isColumns ? y0 : x0;
    const far = Math.max(across, Math.ceil(count / 2));
    const isLined = isColumns ? straight(line, middle, 0, 1, far, column) : straight(middle, line, 1, 0, far, column);
    for (let k = 0; k < count; k++) {
      const [x, y] = isColumns ? [line, first + k] : [first + k, line];
      if (!difference(x, y, d)) {
        profile.cover[k] = 0;
        profile.trust[k] = 0;
        continue;
      }
      let [g0, g1, g2] = [0, 0, 0];
      if (isLined) [g0, g1, g2] = [column[0]!, column[1]!, column[2]!];
      const strength = Math.hypot(d[0]!, d[1]!, d[2]!);
      if (steep > 0.08 && strength > 14 && straight(x, y, isColumns ? 1 : 0, isColumns ? 0 : 1, beyond, under)) {
        if (Math.hypot(under[0]!, under[1]!, under[2]!) > Math.hypot(g0, g1, g2)) [g0, g1, g2] = [under[0]!, under[1]!, under[2]!];
      }
      const [u0, u1, u2] = [i0 - g0, i1 - g1, i2 - g2];
      if (Math.hypot(u0, u1, u2) < 0.4 * size) {
        profile.cover[k] = 0;
        profile.trust[k] = 0;
        continue;
      }
      d[0] = d[0]! - g0;
      d[1] = d[1]! - g1;
      d[2] = d[2]! - g2;
      divide(k, u0, u1, u2);
    }
    return profile;
  };
  return { ink, read };
}
