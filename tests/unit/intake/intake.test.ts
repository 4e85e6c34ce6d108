import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { intake, IntakeRefused, type IntakePicture } from '@/lib/server/pictures/intake';
import { pngChunks } from '@/lib/server/pictures/png-chunks';
import { bomb, oddPictures, plainPixels, type OddPicture } from '../../support/odd-pictures';
import { pngChunk } from '../../support/png-writer';

let odd: ReadonlyMap<string, OddPicture>;
beforeAll(async () => {
  odd = new Map((await oddPictures()).map((picture) => [picture.name, picture]));
});

const take = (name: string): Promise<IntakePicture> => intake(odd.get(name)!.bytes);

const pixel = ({ rgb, width }: IntakePicture, x: number, y: number) => [...rgb.subarray(3 * (y * width + x), 3 * (y * width + x) + 3)];

const plain = plainPixels();
const plainPixel = (x: number, y: number) => [...plain.rgb.subarray(3 * (y * plain.width + x), 3 * (y * plain.width + x) + 3)];

/** Largest difference of any sample from the plain drawing. */
const offPlain = ({ rgb }: IntakePicture) => rgb.reduce((most, sample, at) => Math.max(most, Math.abs(sample - plain.rgb[at]!)), 0);

async function refusal(bytes: Uint8Array): Promise<IntakeRefused> {
  try {
    await intake(bytes);
  } catch (error) {
    if (error instanceof IntakeRefused) return error;
    throw error;
  }
  throw new Error('the file was taken');
}

describe('every odd picture', () => {
  it('becomes an opaque 8-bit RGB PNG of header, pixels and end alone', async () => {
    for (const { name, bytes } of odd.values()) {
      const { png } = await intake(bytes);
      const chunks = pngChunks(png);
      expect(new Set(chunks.map(({ type }) => type)), name).toEqual(new Set(['IHDR', 'IDAT', 'IEND']));
      expect([chunks[0]!.data[8], chunks[0]!.data[9]], name).toEqual([8, 2]);
    }
  });

  it('has the same pixels in its PNG as in its bytes', async () => {
    for (const { name, bytes } of odd.values()) {
      const { png, rgb, width, height } = await intake(bytes);
      const { data, info } = await sharp(png).raw().toBuffer({ resolveWithObject: true });
      expect([info.width, info.height, info.channels], name).toEqual([width, height, 3]);
      expect(Buffer.compare(data, rgb), name).toBe(0);
    }
  });

  it('is taken in again without change', async () => {
    for (const { name, bytes } of odd.values()) {
      const once = await intake(bytes);
      const twice = await intake(once.png);
      expect(twice.pixelsSha256, name).toBe(once.pixelsSha256);
      expect(twice.pngSha256, name).toBe(once.pngSha256);
      expect(twice.notes, name).toEqual([]);
    }
  });

  it('is the same bytes every time', async () => {
    for (const { name, bytes } of odd.values()) {
      const [one, other] = [await intake(bytes), await intake(bytes)];
      expect(Buffer.compare(one.png, other.png), name).toBe(0);
    }
  });
});

describe('the hashes', () => {
  const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

  it('are those of the file, of the PNG, and of width, height and RGB', async () => {
    const picture = await take('plain.png');
    expect(picture.fileSha256).toBe(sha256(odd.get('plain.png')!.bytes));
    expect(picture.pngSha256).toBe(sha256(picture.png));
    // 48 and 32 as uint32 little-endian
    expect(picture.pixelsSha256).toBe(sha256(Buffer.concat([Buffer.of(48, 0, 0, 0, 32, 0, 0, 0), plain.rgb])));
  });

  it('of pixels do not depend on the kind of file', async () => {
    const names = ['plain.png', 'rgb16.png', 'interlaced.png', 'plain.tif', 'srgb-chunk.png', 'resolution.png', 'animated.png'];
    const hashes = await Promise.all(names.map(async (name) => (await take(name)).pixelsSha256));
    expect(new Set(hashes).size).toBe(1);
  });

  it('tell a picture from the same bytes in another shape', async () => {
    const shape = (width: number, height: number) =>
      sharp(Buffer.alloc(3 * 12, 9), { raw: { width, height, channels: 3 } })
        .png()
        .toBuffer();
    const [wide, tall] = [await intake(await shape(6, 2)), await intake(await shape(2, 6))];
    expect(wide.pixelsSha256).not.toBe(tall.pixelsSha256);
  });
});

describe('the kind of the file', () => {
  it.each([
    ['plain.png', 'image/png'],
    ['420.jpg', 'image/jpeg'],
    ['lossy.webp', 'image/webp'],
    ['plain.gif', 'image/gif'],
    ['plain.tif', 'image/tiff'],
  ])('of %s is %s by its content', async (name, mediaType) => {
    expect((await take(name)).mediaType).toBe(mediaType);
  });
});

describe('the pixels', () => {
  it('of lossless forms are those of the drawing', async () => {
    for (const name of ['plain.png', 'rgb16.png', 'interlaced.png', 'plain.tif', 'srgb-chunk.png'])
      expect(offPlain(await take(name)), name).toBe(0);
  });

  it.each([1, 2, 3, 4, 5, 6, 7, 8])('of a JPEG with EXIF orientation %i stand upright', async (orientation) => {
    const picture = await take(`exif-${orientation}.jpg`);
    const sideways = orientation > 4;
    expect([picture.width, picture.height]).toEqual(sideways ? [32, 48] : [48, 32]);
    // where EXIF 2.32, table 6, puts the first row and column of the file
    const [right, down] = [picture.width - 1, picture.height - 1];
    const corner = { 1: [0, 0], 2: [right, 0], 3: [right, down], 4: [0, down], 5: [0, 0], 6: [right, 0], 7: [right, down], 8: [0, down] }[
      orientation
    ]!;
    const [r, g, b] = pixel(picture, corner[0]!, corner[1]!);
    const [red, green, blue] = plainPixel(0, 0);
    expect(Math.max(Math.abs(r! - red!), Math.abs(g! - green!), Math.abs(b! - blue!))).toBeLessThan(12);
    expect(picture.notes.some((note) => note.includes('turned upright'))).toBe(orientation !== 1);
  });

  it('lay transparency on white', async () => {
    const picture = await take('rgba.png');
    expect(pixel(picture, 20, 3)).toEqual([255, 255, 255]);
    const alpha = Math.round((255 * 24) / 47);
    const [red] = plainPixel(24, 30);
    expect(pixel(picture, 24, 30)[0]).toBe(Math.round((red! * alpha + 255 * (255 - alpha)) / 255));
    expect(pixel(picture, 47, 30)).toEqual(plainPixel(47, 30));
    expect(picture.notes).toEqual(['Transparent parts were laid on white.']);
  });

  it('lay a clear palette colour and a colour key on white', async () => {
    expect(pixel(await take('palette-clear.png'), 0, 0)).toEqual([255, 255, 255]);
    expect(pixel(await take('colour-key.png'), 0, 0)).toEqual([255, 255, 255]);
  });

  it('convert a gamma: sRGB of the light that the samples stand for', async () => {
    // half of full light is sRGB 188: 255 · (1.055 · 0.5^(1/2.4) − 0.055) = 187.5 (IEC 61966-2-1); gAMA 1.0 makes the sample the light
    const half = await sharp(Buffer.alloc(3, 128), { raw: { width: 1, height: 1, channels: 3 } })
      .png()
      .toBuffer();
    const withGamma = (gamma: number) => {
      const data = Buffer.alloc(4);
      data.writeUInt32BE(gamma);
      return Buffer.concat([half.subarray(0, 33), pngChunk('gAMA', data), half.subarray(33)]);
    };
    expect(pixel(await intake(withGamma(100000)), 0, 0)).toEqual([188, 188, 188]);
    expect(pixel(await intake(withGamma(45455)), 0, 0)).toEqual([128, 128, 128]);
    expect((await intake(withGamma(100000))).notes).toEqual(['The colours were converted to sRGB.']);
  });

  it('convert a gamma of 16 bits without steps', async () => {
    const [eight, sixteen] = [await take('gamma-linear.png'), await take('gamma16.png')];
    // both hold the same light
    expect(sixteen.rgb.every((sample, at) => Math.abs(sample - eight.rgb[at]!) <= 1)).toBe(true);
  });

  it('keep grey under other primaries of the same white', async () => {
    const grey = await sharp(Buffer.from([90, 90, 90, 255, 255, 255]), { raw: { width: 2, height: 1, channels: 3 } })
      .png()
      .toBuffer();
    const wide = pngChunks(odd.get('wide-gamut.png')!.bytes).filter(({ type }) => type === 'gAMA' || type === 'cHRM');
    const picture = await intake(Buffer.concat([grey.subarray(0, 33), ...wide.map(({ whole }) => whole), grey.subarray(33)]));
    for (const x of [0, 1])
      expect(pixel(picture, x, 0)).toEqual([
        x ? 255 : expect.closeTo(90, -0.5),
        x ? 255 : expect.closeTo(90, -0.5),
        x ? 255 : expect.closeTo(90, -0.5),
      ]);
  });

  it('make colours of wider primaries stronger', async () => {
    const picture = await take('wide-gamut.png');
    // a mostly green place: sRGB needs more contrast between its channels for the same colour
    const [r, g, b] = pixel(picture, 30, 30);
    const [red, green, blue] = plainPixel(30, 30);
    expect(g! - Math.min(r!, b!)).toBeGreaterThan(green! - Math.min(red!, blue!));
  });

  it('let a profile or an sRGB chunk go before a false gamma', async () => {
    expect(offPlain(await take('srgb-chunk.png'))).toBe(0);
    // converted to Display P3 when it was made, and back here
    expect(offPlain(await take('profile.png'))).toBeLessThan(9);
  });

  it('are those of the first frame, first page or still picture', async () => {
    const first = await take('rgba.png');
    for (const name of ['animated.webp', 'pages.tif']) expect((await take(name)).pixelsSha256, name).toBe(first.pixelsSha256);
    expect((await take('animated.webp')).notes).toContain('The picture is animated: only its first frame was taken.');
    expect((await take('animated.gif')).notes).toContain('The picture is animated: only its first frame was taken.');
    expect((await take('animated.png')).notes).toEqual(['The picture is animated: only its first frame was taken.']);
    expect((await take('pages.tif')).notes).toContain('The file has 3 pages: only the first was taken.');
    const gif = await take('animated.gif');
    expect([gif.width, gif.height]).toEqual([48, 32]);
  });
});

describe('a file is refused with a sentence', () => {
  const svg = '<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>';
  it.each<[string, Uint8Array, string, RegExp]>([
    ['nothing', new Uint8Array(), 'empty', /empty/],
    ['text', Buffer.from('I, A; Qc, W\n1; 2\n'), 'not-an-image', /not a picture/],
    ['an SVG', Buffer.from(svg), 'unsupported-kind', /an SVG drawing\. Save the chart as PNG/],
    ['a PDF', Buffer.from('%PDF-1.7\n'), 'unsupported-kind', /a PDF document/],
    ['a HEIF', Buffer.from('\0\0\0\x18ftypheic\0\0\0\0', 'latin1'), 'unsupported-kind', /a HEIF picture/],
    ['an AVIF', Buffer.from('\0\0\0\x18ftypavif\0\0\0\0', 'latin1'), 'unsupported-kind', /an AVIF picture/],
    ['a BMP', Buffer.from('BM\0\0\0\0\0\0', 'latin1'), 'unsupported-kind', /a BMP picture/],
    ['an office document', Buffer.from('PK\x03\x04aaaa', 'latin1'), 'unsupported-kind', /ZIP archive or an office document/],
    ['a PNG signature and no more', Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'), 'damaged', /damaged or stops before its end/],
    ['a TIFF head before an SVG', Buffer.concat([Buffer.from('II*\0'), Buffer.from(svg)]), 'damaged', /damaged/],
    ['a header of 20 000 × 20 000', bomb(20_000, 20_000), 'too-many-pixels', /more than 40 megapixels/],
    ['a header of 8 000 × 5 001', bomb(8_000, 5_001), 'too-many-pixels', /more than 40 megapixels/],
    ['a header that promises pixels that never come', bomb(1000, 1000), 'damaged', /damaged or stops/],
  ])('%s', async (_, bytes, code, message) => {
    const refused = await refusal(bytes);
    expect(refused.code).toBe(code);
    expect(refused.message).toMatch(message);
    expect(refused.message).toMatch(/^[A-Z].*\.$/);
  });

  it('an AVIF that the decoder could have read', async () => {
    const avif = await sharp(Buffer.alloc(3 * 64, 50), { raw: { width: 8, height: 8, channels: 3 } })
      .avif()
      .toBuffer();
    expect((await refusal(avif)).code).toBe('unsupported-kind');
    // even behind the head of an allowed kind, its loader is not there
    await expect(sharp(avif).metadata()).rejects.toThrow(/unsupported image format/);
    await expect(sharp(Buffer.from(svg)).metadata()).rejects.toThrow(/unsupported image format/);
  });

  it('whatever stops before its end: never a picture with pixels that the file does not hold', async () => {
    for (const name of [
      'plain.png',
      'interlaced.png',
      'palette.png',
      '420.jpg',
      'progressive.jpg',
      'lossy.webp',
      'alpha.webp',
      'plain.gif',
      'plain.tif',
    ]) {
      const { bytes } = odd.get(name)!;
      const whole = await intake(bytes);
      let refused = 0;
      for (let share = 1; share < 40; share++) {
        const cut = bytes.subarray(0, Math.floor((bytes.length * share) / 40));
        const outcome = await intake(cut).catch((error: unknown) => error);
        if (outcome instanceof IntakeRefused) refused += 1;
        else expect((outcome as IntakePicture).pixelsSha256, `${name} cut at ${share}/40`).toBe(whole.pixelsSha256);
      }
      expect(refused, name).toBeGreaterThan(30);
    }
  });

  it('whatever is spoiled at random: a picture or a refusal, never another error', async () => {
    const { uniforms } = await import('../../support/random');
    const random = uniforms(4711);
    for (const { name, bytes } of odd.values()) {
      for (let run = 0; run < 6; run++) {
        const spoiled = Buffer.from(bytes);
        for (let hit = 0; hit < 4; hit++) spoiled[Math.floor(random() * spoiled.length)] = Math.floor(random() * 256);
        const outcome = await intake(spoiled).catch((error: unknown) => error);
        if (outcome instanceof Error) expect(outcome, `${name}: ${outcome.message}`).toBeInstanceOf(IntakeRefused);
      }
    }
  });
});

describe('what is appended to a picture', () => {
  it('does not come through', async () => {
    const { bytes } = odd.get('plain.png')!;
    const polyglot = Buffer.concat([bytes, Buffer.from('<script>alert(1)</script>')]);
    const picture = await intake(polyglot);
    expect(picture.png.includes('script')).toBe(false);
    expect(picture.pixelsSha256).toBe((await take('plain.png')).pixelsSha256);
  });

  it('or hidden in its text chunks does not come through either', async () => {
    const { bytes } = odd.get('plain.png')!;
    const told = Buffer.concat([bytes.subarray(0, 33), pngChunk('tEXt', Buffer.from('Author\0a secret place')), bytes.subarray(33)]);
    expect((await intake(told)).png.includes('secret')).toBe(false);
  });
});
