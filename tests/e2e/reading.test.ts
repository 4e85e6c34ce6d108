import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import type { ModelAnswer } from '@/lib/contracts';
import { toPixel } from '@/lib/geometry';
import { moduleOf } from '@/lib/reading';
import { ampere, kelvin, type Ampere, type Kelvin, ZERO_CELSIUS } from '@/lib/units';
import { benchOf, drawing } from '../support/bench';
import { useBrowser } from '../support/browser';
import { documentOf, frameOf, truthOf } from '../support/charts';
import { signInAs } from '../support/people';
import { normals } from '../support/random';
import { listens } from '../support/arrange';

const { visit } = useBrowser();

/** Limits for a reading by hand, in percent of the module's Qmax and Vmax at the chart's hot side. */
const HEAT_PERCENT = 1.5;
const VOLTAGE_PERCENT = 5;
/** A hand that hits what it aims at to half a pixel of the picture. */
const SCATTER_PX = 0.5;
const CLICKS = 8;

/** Sheet with both pages, module with its ratings, and the bench of a new reading, all through the screens. */
async function startReading(page: Page): Promise<void> {
  await signInAs(page, 'engineer');
  await page.goto('/sheets/new');
  await listens(page);
  await page.getByRole('combobox', { name: 'Vendor' }).fill('Sandpiper Cooling');
  await page.getByLabel('Number', { exact: true }).fill('SC-27');
  await page.getByRole('button', { name: 'Add the sheet' }).click();
  await page.waitForURL(/\/sheets\/\d+$/);
  await listens(page);
  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Choose pictures' }).click();
  await (await chooser).setFiles([drawing('d01.png'), drawing('d03.png')]);
  await page.getByRole('img', { name: /^Page 2/ }).waitFor();
  await page.getByRole('button', { name: 'Add a module' }).click();
  await page.getByLabel('Part number').fill('Specimen E');
  await page.getByLabel('Couples').fill('127');
  await page.getByRole('button', { name: 'Add and start a reading' }).click();
  await page.waitForURL(/\/bench\/\d+$/);
}

/** Tells a chart, frames it by its four corners and clicks along its curves. */
async function readChart(page: Page, name: string, kind: string, seed: number): Promise<void> {
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
    for (let k = 0; k < CLICKS; k++) {
      const at = Math.round((k * (x.length - 1)) / (CLICKS - 1));
      await bench.click(near(toPixel(frame, [x[at]!, y[at]!])));
    }
  }
  await page.getByText('All curves of this chart are ready for the model.').waitFor();
}

/** Root mean square of model minus truth over every point of the true curves, in percent of `of`. */
function rmsPercent(name: string, of: number, predict: (I: Ampere, Tc: Kelvin, Th: Kelvin) => number): number {
  const { hotSideC, curves } = truthOf(name);
  const Th = hotSideC + ZERO_CELSIUS;
  const errors = curves.flatMap(({ value, x, y }) => x.map((dT, at) => predict(ampere(value), kelvin(Th - dT), kelvin(Th)) - y[at]!));
  return (100 * Math.sqrt(errors.reduce((sum, error) => sum + error * error, 0) / errors.length)) / of;
}

describe('a reading made by hand', () => {
  test('two charts, framed and clicked with the mouse, give the heat and the voltage of the module that was drawn', async () => {
    const { page } = await visit();
    await startReading(page);
    await listens(page);
    const bench = benchOf(page);
    await page.getByRole('heading', { name: 'Begin with a page' }).waitFor();
    await page.getByRole('complementary', { name: 'Station' }).getByRole('button', { name: /d01/ }).click();
    await readChart(page, 'd01', 'Heat over temperature difference', 1);
    await page.getByRole('button', { name: 'Add a chart' }).click();
    await page.getByRole('dialog').getByRole('button', { name: /d03/ }).click();
    await readChart(page, 'd03', 'Voltage over temperature difference', 2);

    const fitted = page.waitForResponse((response) => response.url().endsWith('/model') && response.ok());
    await page.getByRole('button', { name: 'Go on to the model' }).click();
    const { result } = (await (await fitted).json()) as ModelAnswer;
    await page.getByText('α, Seebeck coefficient').waitFor();
    await page.getByText(/α, R and K are those at 27.°C/).waitFor();
    const module = moduleOf(result!.model!);
    const { Qmax, Vmax } = truthOf('d01');
    expect(rmsPercent('d01', Qmax, (I, Tc, Th) => module.heat(I, Tc, Th))).toBeLessThanOrEqual(HEAT_PERCENT);
    expect(rmsPercent('d03', Vmax, (I, Tc, Th) => module.voltage(I, Tc, Th))).toBeLessThanOrEqual(VOLTAGE_PERCENT);

    await bench.saved();
    await page.reload();
    await listens(page);
    await bench.station('Curves');
    expect(await bench.points()).toHaveLength(CLICKS);
    await bench.station('Hand in');
    await page.getByText('The charts give a model').waitFor();
    await page.getByLabel('Note to the reviewer').fill('Both charts by hand.');
    await page.getByRole('button', { name: 'Hand in', exact: true }).last().click();
    await page.getByRole('button', { name: 'Take it back' }).or(page.getByText('read only')).first().waitFor();
    await bench.station('Hand in');
    await page.getByRole('button', { name: 'Take it back' }).click();
    await bench.station('Hand in');
    await page.getByRole('button', { name: 'Hand in', exact: true }).last().waitFor();
  });
});
