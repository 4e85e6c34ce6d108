import sharp, { type Sharp } from 'sharp';
import { PNG_SIGNATURE, pngChunk, pngHeader, uint32s, writePng } from './png-writer';

/** A picture in an unusual form, and what is unusual about it. */
export interface OddPicture {
  readonly name: string;
  readonly bytes: Buffer;
  readonly note: string;
}

const WIDTH = 48;
const HEIGHT = 32;

/** A small drawing with ramps, a coloured line and a corner that tells all eight orientations apart. */
function sampleAt(x: number, y: number): readonly [number, number, number] {
  if (x < 10 && y < 6) return [200, 30, 40];
  if (Math.abs(y - 20 + x / 4) < 1) return [30, 60, 170];
  const ramp = Math.round((255 * x) / (WIDTH - 1));
  return [ramp, Math.round((255 * y) / (HEIGHT - 1)), 255 - ramp];
}

type Painter = (x: number, y: number) => readonly number[];

const cells = (paint: Painter, width = WIDTH, height = HEIGHT) =>
  Array.from({ length: height }, (_, y) => Array.from({ length: width }, (__, x) => paint(x, y)).flat());
const bytesOf = (paint: Painter) => cells(paint).map((row) => Uint8Array.from(row));
const wordsOf = (paint: Painter) =>
  cells(paint).map((row) => {
    const data = Buffer.alloc(2 * row.length);
    row.forEach((value, at) => data.writeUInt16BE(value, 2 * at));
    return data;
  });

const size = { width: WIDTH, height: HEIGHT };
const alphaAt = (x: number, y: number) => (y < 8 ? 0 : Math.round((255 * x) / (WIDTH - 1)));
const greyAt = (x: number, y: number) => Math.round((sampleAt(x, y)[0] + sampleAt(x, y)[1]) / 2);
const rgba: Painter = (x, y) => [...sampleAt(x, y), alphaAt(x, y)];
const deep: Painter = (x, y) => sampleAt(x, y).map((value) => value * 257);

const raw = (paint: Painter, channels: 3 | 4): Sharp => sharp(Buffer.from(cells(paint).flat()), { raw: { ...size, channels } });
const opaque = () => raw(sampleAt, 3);
const seeThrough = () => raw(rgba, 4);

/** A picture of several frames, each a shade of its own, above one another in one raw block. */
const frames = (count: number): Sharp => {
  const paint: Painter = (x, y) => (y < HEIGHT ? rgba(x, y) : [10 * Math.floor(y / HEIGHT), 90, x, 255]);
  return sharp(Buffer.from(cells(paint, WIDTH, HEIGHT * count).flat()), {
    raw: { width: WIDTH, height: HEIGHT * count, channels: 4, pageHeight: HEIGHT },
  });
};

const CHRM_WIDE = [31270, 32900, 68000, 32000, 26500, 69000, 15000, 6000] as const;

function pngs(): OddPicture[] {
  const rgb = { ...size, type: 'rgb', bits: 8, rows: bytesOf(sampleAt) } as const;
  const shades = Array.from({ length: 16 }, (_, at) => [17 * at, 255 - 17 * at, (at * 71) % 256]);
  const indexed = cells((x, y) => [(x + y) % 16]).map((row) =>
    Uint8Array.from({ length: WIDTH / 2 }, (_, at) => ((row[2 * at] ?? 0) << 4) | (row[2 * at + 1] ?? 0)),
  );
  const bilevel = cells((x, y) => [(x ^ y) & 4 ? 1 : 0]).map((row) =>
    Uint8Array.from({ length: WIDTH / 8 }, (_, at) => row.slice(8 * at, 8 * at + 8).reduce((byte, bit) => (byte << 1) | bit, 0)),
  );
  const palette = ['PLTE', Uint8Array.from(shades.flat())] as const;
  const make = (name: string, note: string, bytes: Buffer): OddPicture => ({ name: `${name}.png`, bytes, note });
  return [
    make('plain', '8-bit RGB', writePng(rgb)),
    make('rgb16', '16 bits a sample', writePng({ ...size, type: 'rgb', bits: 16, rows: wordsOf(deep) })),
    make('grey', '8-bit grey', writePng({ ...size, type: 'grey', bits: 8, rows: bytesOf((x, y) => [greyAt(x, y)]) })),
    make('grey16', '16-bit grey', writePng({ ...size, type: 'grey', bits: 16, rows: wordsOf((x, y) => [257 * greyAt(x, y)]) })),
    make(
      'grey-alpha',
      'grey with alpha',
      writePng({ ...size, type: 'greyAlpha', bits: 8, rows: bytesOf((x, y) => [greyAt(x, y), alphaAt(x, y)]) }),
    ),
    make('rgba', 'RGB with alpha', writePng({ ...size, type: 'rgba', bits: 8, rows: bytesOf(rgba) })),
    make(
      'rgba16',
      '16 bits a sample with alpha',
      writePng({ ...size, type: 'rgba', bits: 16, rows: wordsOf((x, y) => [...deep(x, y), 257 * alphaAt(x, y)]) }),
    ),
    make('bilevel', 'one bit a pixel', writePng({ ...size, type: 'grey', bits: 1, rows: bilevel })),
    make('palette', 'sixteen colours of a palette', writePng({ ...size, type: 'palette', bits: 4, rows: indexed, before: [palette] })),
    make(
      'palette-clear',
      'a palette with clear colours',
      writePng({ ...size, type: 'palette', bits: 4, rows: indexed, before: [palette, ['tRNS', Uint8Array.of(0, 128, 64)]] }),
    ),
    make('colour-key', 'one colour is clear', writePng({ ...rgb, before: [['tRNS', Uint8Array.of(0, 200, 0, 30, 0, 40)]] })),
    make('gamma-linear', 'gAMA 1.0', writePng({ ...rgb, before: [['gAMA', uint32s(100000)]] })),
    make('gamma-18', 'gAMA 1/1.8', writePng({ ...rgb, before: [['gAMA', uint32s(55556)]] })),
    make(
      'gamma16',
      '16 bits with gAMA 1.0',
      writePng({ ...size, type: 'rgb', bits: 16, rows: wordsOf(deep), before: [['gAMA', uint32s(100000)]] }),
    ),
    make(
      'gamma-alpha',
      'gAMA 1/1.8 with alpha',
      writePng({ ...size, type: 'rgba', bits: 8, rows: bytesOf(rgba), before: [['gAMA', uint32s(55556)]] }),
    ),
    make(
      'wide-gamut',
      'gAMA and cHRM of wider primaries',
      writePng({
        ...rgb,
        before: [
          ['gAMA', uint32s(45455)],
          ['cHRM', uint32s(...CHRM_WIDE)],
        ],
      }),
    ),
    make(
      'srgb-chunk',
      'an sRGB chunk that overrides a false gAMA',
      writePng({
        ...rgb,
        before: [
          ['sRGB', Uint8Array.of(0)],
          ['gAMA', uint32s(100000)],
        ],
      }),
    ),
    make(
      'resolution',
      'a resolution of unequal sides',
      writePng({ ...rgb, before: [['pHYs', Buffer.concat([uint32s(2000, 4000), Buffer.of(1)])]] }),
    ),
    make(
      'animated',
      'an animated PNG',
      writePng({
        ...rgb,
        before: [
          ['acTL', uint32s(2, 0)],
          ['fcTL', Buffer.concat([uint32s(0, WIDTH, HEIGHT, 0, 0), Buffer.of(0, 1, 0, 10, 0, 0)])],
        ],
      }),
    ),
  ];
}

async function others(): Promise<OddPicture[]> {
  const turned = Array.from({ length: 8 }, (_, at): [string, string, Sharp] => [
    `exif-${at + 1}.jpg`,
    `EXIF orientation ${at + 1}`,
    opaque()
      .jpeg({ quality: 95, chromaSubsampling: '4:4:4' })
      .withMetadata({ orientation: at + 1 }),
  ]);
  const plans: [string, string, Sharp][] = [
    ['420.jpg', 'JPEG 4:2:0', opaque().jpeg({ quality: 80, chromaSubsampling: '4:2:0' })],
    ['444.jpg', 'JPEG 4:4:4', opaque().jpeg({ quality: 90, chromaSubsampling: '4:4:4' })],
    ['progressive.jpg', 'progressive JPEG', opaque().jpeg({ progressive: true })],
    ['grey.jpg', 'grey JPEG', opaque().toColourspace('b-w').jpeg()],
    ['cmyk.jpg', 'CMYK JPEG', opaque().toColourspace('cmyk').jpeg()],
    ['wide-gamut.jpg', 'JPEG with a Display P3 profile', opaque().withIccProfile('p3').jpeg({ quality: 95 })],
    ...turned,
    ['profile.png', 'PNG with a Display P3 profile', opaque().withIccProfile('p3').png()],
    ['interlaced.png', 'interlaced PNG', opaque().png({ progressive: true })],
    ['lossy.webp', 'lossy WebP', opaque().webp({ quality: 85 })],
    ['alpha.webp', 'lossless WebP with alpha', seeThrough().webp({ lossless: true })],
    ['animated.webp', 'animated WebP', frames(3).webp({ lossless: true, delay: [50, 50, 50] })],
    ['plain.gif', 'GIF', opaque().gif()],
    ['animated.gif', 'animated GIF with clear parts', frames(3).gif({ delay: [50, 50, 50] })],
    ['plain.tif', 'TIFF, LZW', opaque().tiff({ compression: 'lzw' })],
    [
      'bilevel.tif',
      'TIFF of one bit a pixel',
      opaque().threshold(120).toColourspace('b-w').tiff({ bitdepth: 1, compression: 'ccittfax4' }),
    ],
    ['cmyk.tif', 'CMYK TIFF', opaque().toColourspace('cmyk').tiff({ compression: 'deflate' })],
    ['alpha.tif', 'TIFF with alpha', seeThrough().tiff({ compression: 'deflate' })],
    ['turned.tif', 'TIFF with orientation 6', opaque().withMetadata({ orientation: 6 }).tiff({ compression: 'none' })],
    ['pages.tif', 'TIFF of three pages', frames(3).tiff({ compression: 'lzw' })],
  ];
  return Promise.all(plans.map(async ([name, note, picture]) => ({ name, note, bytes: await picture.toBuffer() })));
}

/** Small pictures in every odd form that intake has to take, drawn afresh. */
export const oddPictures = async (): Promise<OddPicture[]> => [...pngs(), ...(await others())];

/** The drawing of the odd pictures as plain 8-bit RGB, for comparison. */
export const plainPixels = (): { width: number; height: number; rgb: Uint8Array } => ({
  ...size,
  rgb: Uint8Array.from(cells(sampleAt).flat()),
});

/** A PNG of a few bytes whose header promises so many pixels. */
export const bomb = (width: number, height: number): Buffer =>
  Buffer.concat([
    PNG_SIGNATURE,
    pngHeader(width, height, 8, 'rgb'),
    pngChunk('IDAT', Buffer.of(0x78, 0x9c, 3, 0, 0, 0, 0, 1)),
    pngChunk('IEND', Buffer.alloc(0)),
  ]);
