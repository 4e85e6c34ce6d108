/** CIELAB coordinates under D65: L* 0 to 100, a* and b* about −128 to 127. */
export type Lab = readonly [L: number, a: number, b: number];

const linear = (byte: number): number => {
  const c = byte / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
};

const EPSILON = 216 / 24389;
const KAPPA = 24389 / 27;
const compressed = (t: number): number => (t > EPSILON ? Math.cbrt(t) : (KAPPA * t + 16) / 116);

/** CIELAB of an sRGB colour given in bytes (IEC 61966-2-1 to XYZ under D65; CIE 15:2018, 8.2.1). */
export function labOf(red: number, green: number, blue: number): Lab {
  const [r, g, b] = [linear(red), linear(green), linear(blue)];
  const x = compressed((0.4124564 * r + 0.3575761 * g + 0.1804375 * b) / 0.95047);
  const y = compressed(0.2126729 * r + 0.7151522 * g + 0.072175 * b);
  const z = compressed((0.0193339 * r + 0.119192 * g + 0.9503041 * b) / 1.08883);
  return [116 * y - 16, 500 * (x - y), 200 * (y - z)];
}

const RADIAN = Math.PI / 180;
const cosine = (degrees: number) => Math.cos(degrees * RADIAN);
const hue = (a: number, b: number) => (a === 0 && b === 0 ? 0 : (Math.atan2(b, a) / RADIAN + 360) % 360);
const chromaFactor = (chroma: number) => Math.sqrt(chroma ** 7 / (chroma ** 7 + 25 ** 7));

/** Difference and mean of two hues in degrees, the short way round; grey has no hue (Sharma 2005, equations 10 and 14). */
function hues(h1: number, h2: number, grey: boolean): [difference: number, mean: number] {
  if (grey) return [0, h1 + h2];
  const apart = h2 - h1;
  if (Math.abs(apart) <= 180) return [apart, (h1 + h2) / 2];
  return [apart > 0 ? apart - 360 : apart + 360, h1 + h2 < 360 ? (h1 + h2 + 360) / 2 : (h1 + h2 - 360) / 2];
}

/**
 * CIEDE2000 difference of two colours with unit factors.
 * Source: G. Sharma, W. Wu, E. N. Dalal, Color Res. Appl. 30(1) (2005) 21-30, equations 2 to 22.
 */
export function colourDifference([L1, a1, b1]: Lab, [L2, a2, b2]: Lab): number {
  const stretch = 1 + 0.5 * (1 - chromaFactor((Math.hypot(a1, b1) + Math.hypot(a2, b2)) / 2));
  const [C1, C2] = [Math.hypot(a1 * stretch, b1), Math.hypot(a2 * stretch, b2)];
  const [dh, h] = hues(hue(a1 * stretch, b1), hue(a2 * stretch, b2), C1 * C2 === 0);
  const [dL, dC, dH] = [L2 - L1, C2 - C1, 2 * Math.sqrt(C1 * C2) * Math.sin((dh / 2) * RADIAN)];
  const [L, C] = [(L1 + L2) / 2, (C1 + C2) / 2];
  const T = 1 - 0.17 * cosine(h - 30) + 0.24 * cosine(2 * h) + 0.32 * cosine(3 * h + 6) - 0.2 * cosine(4 * h - 63);
  const l = dL / (1 + (0.015 * (L - 50) ** 2) / Math.sqrt(20 + (L - 50) ** 2));
  const c = dC / (1 + 0.045 * C);
  const H = dH / (1 + 0.015 * C * T);
  const turn = -Math.sin(60 * Math.exp(-(((h - 275) / 25) ** 2)) * RADIAN) * 2 * chromaFactor(C);
  return Math.sqrt(l * l + c * c + H * H + turn * c * H);
}
