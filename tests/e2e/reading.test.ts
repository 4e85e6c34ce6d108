import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import { moduleOfForm } from '@/lib/module';
import { ampere, kelvin, ohm, type Ampere, type Kelvin, voltPerKelvin, wattPerKelvin, ZERO_CELSIUS } from '@/lib/units';
import { listens } from '../support/arrange';
import { benchOf } from '../support/bench';
import { useBrowser } from '../support/browser';
import { addSecondChart, chooseFirstChart, CLICKS_A_CURVE, readChart, startReading } from '../support/by-hand';
import { truthOf } from '../support/charts';
import { signInAs } from '../support/people';

const { visit } = useBrowser();

/** Limits for a reading by hand, in percent of the module's Qmax and Vmax at the chart's hot side. */
const HEAT_PERCENT = 0.3;
const VOLTAGE_PERCENT = 0.7;

/** A figure as the model station shows it: "0.0520(4) V/K". */
async function shown(page: Page, term: string, unit: string): Promise<number> {
  const text = await page.locator('dt', { hasText: term }).locator('xpath=following-sibling::dd[1]').innerText();
  const figure = new RegExp(`^(\\d+\\.\\d+)\\([\\d.]+\\)\\u00A0${unit}`).exec(text);
  if (!figure) throw new Error(`${term} is shown as “${text}”.`);
  return Number(figure[1]);
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
    await signInAs(page, 'engineer');
    await startReading(page, { vendor: 'Sandpiper Cooling', number: 'SC-27', partNumber: 'Specimen E' });
    const bench = benchOf(page);
    await chooseFirstChart(page, 'd01');
    await readChart(page, 'd01', 'Heat over temperature difference', 1);
    await addSecondChart(page, 'd03');
    await readChart(page, 'd03', 'Voltage over temperature difference', 2);

    await page.getByRole('button', { name: 'Go on to the model' }).click();
    await page.getByText(/α, R and K are those at 27.°C/).waitFor();
    const module = moduleOfForm('leg', {
      alpha: voltPerKelvin(await shown(page, 'α, Seebeck coefficient', 'V/K')),
      R: ohm(await shown(page, 'R, resistance', 'Ω')),
      K: wattPerKelvin(await shown(page, 'K, conductance', 'W/K')),
    });
    const { Qmax, Vmax } = truthOf('d01');
    expect(rmsPercent('d01', Qmax, (I, Tc, Th) => module.heat(I, Tc, Th))).toBeLessThanOrEqual(HEAT_PERCENT);
    expect(rmsPercent('d03', Vmax, (I, Tc, Th) => module.voltage(I, Tc, Th))).toBeLessThanOrEqual(VOLTAGE_PERCENT);

    await bench.saved();
    await page.reload();
    await listens(page);
    await bench.station('Curves');
    expect(await bench.points()).toHaveLength(CLICKS_A_CURVE);
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
