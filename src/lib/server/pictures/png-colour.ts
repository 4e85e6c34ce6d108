import { inverse, Matrix } from 'ml-matrix';
import { pngChunks, type PngChunk } from './png-chunks';

/** What a PNG says about its colours by gAMA and cHRM, when it has no profile and no sRGB chunk, which go first. */
export interface PngColour {
  /** Exponent from the sample to linear light. */
  readonly exponent: number;
  /** Linear RGB of the file to linear sRGB; null when the primaries are those of sRGB or not given. */
  readonly toLinearSrgb: readonly (readonly number[])[] | null;
}

/** PNG (third edition, W3C 2025), 11.3.2: cICP, then iCCP, then sRGB override gAMA and cHRM. */
const OVERRIDES = new Set(['cICP', 'iCCP', 'sRGB']);
/** The gAMA value that goes with sRGB, in hundred-thousandths. */
const SRGB_GAMA = 45455;
/** White and primaries of sRGB as cHRM has them, IEC 61966-2-1. */
const SRGB_CHRM = [31270, 32900, 64000, 33000, 30000, 60000, 15000, 6000] as const;

/** XYZ of a chromaticity at luminance 1. */
const xyzOf = (x: number, y: number) => [x / y, 1, (1 - x - y) / y];

/** Linear RGB with these primaries and white to XYZ: B. Lindbloom, "RGB/XYZ Matrices" (from memory). */
function toXyz(chromaticities: readonly number[]): { matrix: Matrix; white: number[] } {
  const pair = (at: number) => xyzOf((chromaticities[at] ?? 0) / 1e5, (chromaticities[at + 1] ?? 0) / 1e5);
  const white = pair(0);
  const primaries = new Matrix([pair(2), pair(4), pair(6)]).transpose();
  const scale = inverse(primaries).mmul(Matrix.columnVector(white)).to1DArray();
  return { matrix: primaries.mmul(Matrix.diag(scale)), white };
}

/** Bradford cone responses of XYZ (ICC.1:2022, annex E, from memory). */
const BRADFORD = new Matrix([
  [0.8951, 0.2664, -0.1614],
  [-0.7502, 1.7135, 0.0367],
  [0.0389, -0.0685, 1.0296],
]);

function adaptation(from: readonly number[], to: readonly number[]): Matrix {
  const cones = (white: readonly number[]) => BRADFORD.mmul(Matrix.columnVector([...white])).to1DArray();
  const [source, target] = [cones(from), cones(to)];
  const gains = target.map((value, at) => value / (source[at] ?? 1));
  return inverse(BRADFORD).mmul(Matrix.diag(gains)).mmul(BRADFORD);
}

function primariesMatrix(chunk: PngChunk | undefined): number[][] | null {
  if (chunk?.data.length !== 32) return null;
  const values = Array.from({ length: 8 }, (_, at) => chunk.data.readUInt32BE(4 * at));
  if (values.some((value, at) => at % 2 === 1 && value === 0)) return null;
  if (values.every((value, at) => Math.abs(value - (SRGB_CHRM[at] ?? 0)) < 100)) return null;
  const [file, srgb] = [toXyz(values), toXyz(SRGB_CHRM)];
  const matrix = inverse(srgb.matrix).mmul(adaptation(file.white, srgb.white)).mmul(file.matrix).to2DArray();
  return matrix.flat().every(Number.isFinite) ? matrix : null;
}

/** How the samples of a PNG have to be converted to be sRGB; null when they are sRGB as they stand, or carry a profile. */
export function pngColour(png: Uint8Array): PngColour | null {
  const chunks = pngChunks(png);
  if (chunks.some(({ type }) => OVERRIDES.has(type))) return null;
  const gama = chunks.find(({ type, data }) => type === 'gAMA' && data.length === 4)?.data.readUInt32BE(0) ?? 0;
  // without gAMA the primaries alone say nothing that a browser would follow
  if (gama === 0) return null;
  const toLinearSrgb = primariesMatrix(chunks.find(({ type }) => type === 'cHRM'));
  if (Math.abs(gama - SRGB_GAMA) < 500 && !toLinearSrgb) return null;
  return { exponent: 1e5 / gama, toLinearSrgb };
}

/** Linear light to an sRGB sample, both 0 to 1: IEC 61966-2-1. */
const encode = (linear: number) => (linear <= 0.0031308 ? 12.92 * linear : 1.055 * linear ** (1 / 2.4) - 0.055);

const toByte = (linear: number) => Math.round(255 * encode(Math.min(1, Math.max(0, linear))));

/** RGBA samples of a PNG, `full` being the largest value, to 8-bit sRGB with the alpha scaled alike. */
export function toSrgb(samples: Uint8Array | Uint16Array, { exponent, toLinearSrgb }: PngColour): Uint8Array {
  const full = samples instanceof Uint16Array ? 65535 : 255;
  const linear = Float64Array.from({ length: full + 1 }, (_, sample) => (sample / full) ** exponent);
  const bytes = Uint8Array.from(linear, toByte);
  const out = new Uint8Array(samples.length);
  for (let at = 0; at < samples.length; at += 4) {
    const [r, g, b] = [samples[at] ?? 0, samples[at + 1] ?? 0, samples[at + 2] ?? 0];
    for (const channel of [0, 1, 2] as const) {
      const row = toLinearSrgb?.[channel];
      out[at + channel] = row
        ? toByte((row[0] ?? 0) * (linear[r] ?? 0) + (row[1] ?? 0) * (linear[g] ?? 0) + (row[2] ?? 0) * (linear[b] ?? 0))
        : (bytes[samples[at + channel] ?? 0] ?? 0);
    }
    out[at + 3] = Math.round(((samples[at + 3] ?? 0) * 255) / full);
  }
  return out;
}
