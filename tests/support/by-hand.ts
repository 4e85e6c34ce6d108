import type { Page } from 'playwright-core';
import { toPixel } from '@/lib/geometry';
import { listens } from './arrange';
import { benchOf, drawing } from './bench';
import { documentOf, frameOf, truthOf } from './charts';
import { normals } from './random';

/** A hand that hits what it aims at to half a pixel of the picture. */
const SCATTER_PX = 0.5;
export const CLICKS_A_CURVE = 8;

/** Sheet with both pages, module, and the bench of a new reading, all through the screens, by whoever has signed in. */
export async function startReading(page: Page, names: { vendor: string; number: string; partNumber: string }): Promise<void> {
  await page.goto('/sheets/new');
  await listens(page);
  await page.getByRole('combobox', { name: 'Vendor' }).fill(names.vendor);
  await page.getByLabel('Number', { exact: true }).fill(names.number);
  await page.getByRole('button', { name: 'Add the sheet' }).click();
  await page.waitForURL(/\/sheets\/\d+$/);
  await listens(page);
  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Choose pictures' }).click();
  await (await chooser).setFiles([drawing('d01.png'), drawing('d03.png')]);
  await page.getByRole('img', { name: /^Page 2/ }).waitFor();
  await page.getByRole('button', { name: 'Add a module' }).click();
  await page.getByLabel('Part number').fill(names.partNumber);
  await page.getByLabel('Couples').fill('127');
  await page.getByRole('button', { name: 'Add and start a reading' }).click();
  await page.waitForURL(/\/bench\/\d+$/);
  await listens(page);
}

export async function chooseFirstChart(page: Page, name: string): Promise<void> {
  await page.getByRole('heading', { name: 'Begin with a page' }).waitFor();
  await page
    .getByRole('complementary', { name: 'Station' })
    .getByRole('button', { name: new RegExp(name) })
    .click();
}

export async function addSecondChart(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'Add a chart' }).click();
  await page
    .getByRole('dialog')
    .getByRole('button', { name: new RegExp(name) })
    .click();
}

/** Tells a chart, frames it by its four corners and clicks along its curves. */
export async function readChart(page: Page, name: string, kind: string, seed: number): Promise<void> {
  const bench = benchOf(page);
  const chart = documentOf(name).charts[0]!;
  const frame = frameOf(chart);
  const normal = normals(seed);
  const near = ([x, y]: readonly [number, number]) => [x + SCATTER_PX * normal(), y + SCATTER_PX * normal()] as const;
  await page.getByLabel('Kind of chart').selectOption(kind);
  await page.getByLabel('Temperature of the hot side').fill('27 °C');
  await page.getByRole('button', { name: 'Go on to the frame' }).click();
  await bench.fit();
  for (const { px, x, y } of chart.marks!) {
    await bench.click(near(px));
    await page.keyboard.type(String(x));
    await page.keyboard.press('Tab');
    await page.keyboard.type(String(y));
    await page.keyboard.press('Enter');
  }
  await page.getByText('The frame stands.').waitFor();
  await page.getByRole('button', { name: 'Go on to the curves' }).click();
  for (const { value, x, y } of truthOf(name).curves) {
    await page.getByRole('button', { name: 'Add a curve' }).click();
    await page.keyboard.type(String(value));
    await page.keyboard.press('Enter');
    for (let k = 0; k < CLICKS_A_CURVE; k++) {
      const at = Math.round((k * (x.length - 1)) / (CLICKS_A_CURVE - 1));
      await bench.click(near(toPixel(frame, [x[at]!, y[at]!])));
    }
  }
  await page.getByText('All curves of this chart are ready for the model.').waitFor();
}
