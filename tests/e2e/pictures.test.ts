import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { intake } from '@/lib/server/pictures/intake';
import { launch } from '../support/browser';
import { oddPictures, type OddPicture } from '../support/odd-pictures';

/** Samples of a picture as the canvas of a browser sees them, four bytes a pixel. */
interface Seen {
  readonly width: number;
  readonly height: number;
  readonly rgba: Uint8Array;
}

let browser: Browser;
let page: Page;
let odd: readonly OddPicture[];

beforeAll(async () => {
  [browser, odd] = await Promise.all([launch(), oddPictures()]);
  page = await browser.newPage();
  await page.setContent('<!doctype html><title>pictures</title>');
});
afterAll(() => browser?.close());

/** Draws a file on a canvas of the page, on a white ground where asked, and reads it back; null when the browser cannot show it. */
async function seenByBrowser(bytes: Uint8Array, mediaType: string, ground: 'white' | 'none'): Promise<Seen | null> {
  const seen = await page.evaluate(
    async ({ base64, mediaType, ground }) => {
      const image = new Image();
      image.src = URL.createObjectURL(new Blob([Uint8Array.from(atob(base64), (letter) => letter.charCodeAt(0))], { type: mediaType }));
      try {
        await image.decode();
      } catch {
        return null;
      }
      const [width, height] = [image.naturalWidth, image.naturalHeight];
      const context = Object.assign(document.createElement('canvas'), { width, height }).getContext('2d')!;
      context.fillStyle = 'white';
      if (ground === 'white') context.fillRect(0, 0, width, height);
      context.drawImage(image, 0, 0);
      return { width, height, rgba: [...context.getImageData(0, 0, width, height).data] };
    },
    { base64: Buffer.from(bytes).toString('base64'), mediaType, ground },
  );
  return seen && { ...seen, rgba: Uint8Array.from(seen.rgba) };
}

const withAlpha = (rgb: Uint8Array) =>
  Uint8Array.from({ length: (rgb.length / 3) * 4 }, (_, at) => (at % 4 === 3 ? 255 : rgb[Math.floor(at / 4) * 3 + (at % 4)]!));

const difference = (one: Uint8Array, other: Uint8Array) => {
  const off = Array.from(one, (sample, at) => Math.abs(sample - other[at]!));
  return { most: Math.max(...off), mean: off.reduce((sum, value) => sum + value, 0) / off.length };
};

describe('the intake picture of every odd form', () => {
  it('is seen by the browser with the very bytes that the server measures', async () => {
    for (const { name, bytes } of odd) {
      const picture = await intake(bytes);
      const seen = await seenByBrowser(picture.png, 'image/png', 'none');
      expect([seen!.width, seen!.height], name).toEqual([picture.width, picture.height]);
      expect(Buffer.compare(seen!.rgba, withAlpha(picture.rgb)), name).toBe(0);
    }
    expect(odd.length).toBeGreaterThan(40);
  });
});

describe('the file as it came', () => {
  /** What a browser may differ by in a sample: one step of rounding, but for inks, which it turns into light without their profile. */
  const allowed = (name: string) => (name === 'cmyk.jpg' ? { most: 160, mean: 30 } : { most: 1, mean: 0.5 });

  it('looks in the browser as its intake picture does', async () => {
    const shown: string[] = [];
    for (const { name, bytes } of odd) {
      const picture = await intake(bytes);
      const seen = await seenByBrowser(bytes, picture.mediaType, 'white');
      if (!seen) continue;
      shown.push(name);
      expect([seen.width, seen.height], name).toEqual([picture.width, picture.height]);
      const { most, mean } = difference(seen.rgba, withAlpha(picture.rgb));
      expect(most, `${name}: largest difference`).toBeLessThanOrEqual(allowed(name).most);
      expect(mean, `${name}: mean difference`).toBeLessThanOrEqual(allowed(name).mean);
    }
    // a browser shows everything but TIFF
    expect(shown).toEqual(odd.map(({ name }) => name).filter((name) => !name.endsWith('.tif')));
  });
});
