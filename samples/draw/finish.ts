import sharp from 'sharp';
import { normals, uniforms } from './random';
import type { Finish, Scan } from './style';

/** Grey levels after a small symmetric blur (1 2 1 both ways), which shifts nothing. */
function softened(grey: Uint8Array, width: number, height: number): Float64Array {
  const at = (x: number, y: number) => grey[Math.min(height - 1, Math.max(0, y)) * width + Math.min(width - 1, Math.max(0, x))] ?? 255;
  const across = (x: number, y: number) => at(x - 1, y) + 2 * at(x, y) + at(x + 1, y);
  const out = new Float64Array(width * height);
  for (let y = 0; y < height; y++)
    for (let x = 0; x < width; x++) out[y * width + x] = (across(x, y - 1) + 2 * across(x, y) + across(x, y + 1)) / 16;
  return out;
}

/** Makes a clean grey drawing look scanned: soft, darker toward one edge, noisy, with a few specks. */
function scanned(grey: Uint8Array, width: number, height: number, { noise, shade, specks }: Scan, seed: string): Uint8Array {
  const normal = normals(`scan ${seed}`);
  const uniform = uniforms(`specks ${seed}`);
  const levels = softened(grey, width, height);
  const out = new Uint8Array(width * height);
  for (let at = 0; at < out.length; at++) {
    const across = (at % width) / width;
    const paper = 0.965 - shade * across ** 3;
    out[at] = Math.max(0, Math.min(255, Math.round(18 + (levels[at] ?? 255) * paper * 0.93 + noise * normal())));
  }
  for (let count = 0; count < (specks * out.length) / 1e6; count++) {
    const at = Math.floor(uniform() * out.length);
    for (const next of [at, at + 1, at + width]) if (next < out.length) out[next] = Math.round(60 + 60 * uniform());
  }
  return out;
}

/** Turns a drawing into the bytes of its file; the same drawing gives the same bytes. */
export async function finish(svg: string, kind: Finish, seed: string): Promise<Buffer> {
  const drawn = sharp(Buffer.from(svg)).flatten({ background: '#ffffff' });
  if (kind.file === 'png') {
    if (kind.grey) return drawn.toColourspace('b-w').png({ compressionLevel: 9 }).toBuffer();
    const palette = kind.colours ? { palette: true, colours: kind.colours, dither: 0, effort: 10 } : {};
    return drawn.png({ compressionLevel: 9, ...palette }).toBuffer();
  }
  const jpeg = { quality: kind.quality, chromaSubsampling: '4:2:0' };
  if (!kind.scan) return drawn.jpeg(jpeg).toBuffer();
  const { data, info } = await drawn.toColourspace('b-w').raw().toBuffer({ resolveWithObject: true });
  const grey = info.channels === 1 ? data : data.filter((_, at) => at % info.channels === 0);
  const raw = { width: info.width, height: info.height, channels: 1 } as const;
  return sharp(scanned(grey, info.width, info.height, kind.scan, seed), { raw })
    .toColourspace('b-w')
    .jpeg(jpeg)
    .toBuffer();
}
