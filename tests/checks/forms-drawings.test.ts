import { describe, expect, it } from 'vitest';
import { fitForm, moduleOfFit, type ModuleFit } from '@/lib/fit';
import { moduleOf, readWithFit, type ReadingDocument } from '@/lib/reading';
import { kelvin } from '@/lib/units';
import type { ThermoelectricModule } from '@/lib/module';
import { blankHost, clickedDocument, truthOf } from '../support/charts';

/*
 * Truth: tests/fixtures/charts, drawn from a one-dimensional solution of the leg heat equation with contacts and plates (see the README there), no code of
 * this program. Limits: those set for the product, in percent of Qmax and Vmax, root mean square.
 */
const rms = (values: readonly number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

/** What a module misses of the exact curves of a drawing of heat or voltage over ΔT. */
function missOf(module: ThermoelectricModule, name: string, answer: 'heat' | 'voltage'): number {
  const { hotSideC, curves, Qmax, Vmax } = truthOf(name);
  const Th = kelvin(hotSideC + 273.15);
  const errors = curves.flatMap(({ value, x, y }) => x.map((dT, i) => module[answer](value, kelvin(Th - dT), Th) - y[i]!));
  return (100 * rms(errors)) / (answer === 'heat' ? Qmax : Vmax);
}

const withForm = (document: ReadingDocument, form: 'auto' | 'leg' | 'shaped'): ReadingDocument => ({ ...document, model: { form } });

describe.each([61, 62, 63])('the leg form on d01 and d03, eight clicks a curve off by half a pixel, seed %i', (seed) => {
  const document = withForm(clickedDocument(['d01', 'd03'], { count: 8, scatterPx: 0.5, seed }), 'leg');

  it('keeps to the sheet within 0.3 % of Qmax and 0.7 % of Vmax, and foretells the unseen hot side of d02 within 0.6 %', async () => {
    const module = moduleOf((await readWithFit(document, blankHost)).result.model!);
    expect(missOf(module, 'd01', 'heat')).toBeLessThan(0.3);
    expect(missOf(module, 'd03', 'voltage')).toBeLessThan(0.7);
    expect(missOf(module, 'd02', 'heat')).toBeLessThan(0.6);
  });
});

describe('the form left to the program', () => {
  it('is the leg form for d01 and d03, by leaving out a curve, and says how much better it foretells', async () => {
    const { result } = await readWithFit(clickedDocument(['d01', 'd03'], { count: 8, scatterPx: 0.5, seed: 71 }), blankHost);
    expect(result.model).toMatchObject({ form: 'leg', at: '300.15 K', choice: { leftOut: 'curve' } });
    const score = Object.fromEntries(result.model!.choice!.scores.map(({ form, percentOfRange }) => [form, percentOfRange!]));
    expect(score['leg']).toBeLessThan(0.5 * score['shaped']!);
    expect(score['shaped']).toBeLessThan(score['constant']!);
  });

  it('is the leg form for d01, d02 and d03, by leaving out a hot side', async () => {
    const { result } = await readWithFit(clickedDocument(['d01', 'd02', 'd03'], { count: 8, scatterPx: 0.5, seed: 72 }), blankHost);
    expect(result.model).toMatchObject({ form: 'leg', choice: { leftOut: 'hotSide' } });
  });

  it('implies the ratings of the module within 1 %, Imax too', async () => {
    const { result } = await readWithFit(clickedDocument(['d01', 'd03'], { count: 8, scatterPx: 0.5, seed: 73 }), blankHost);
    const { Imax, Qmax, dTmax, Vmax } = truthOf('d01');
    const derived = result.model!.derived.find(({ hotSideC }) => hotSideC === 27)!;
    expect(Math.abs(derived.imaxLargestDeltaT.value / Imax - 1)).toBeLessThan(0.01);
    expect(Math.abs(derived.qmaxW.value / Qmax - 1)).toBeLessThan(0.01);
    expect(Math.abs(derived.dTmaxK.value / dTmax - 1)).toBeLessThan(0.01);
    expect(Math.abs(derived.vmaxV.value / Vmax - 1)).toBeLessThan(0.01);
  });

  it('of module F, a turned scan and a photograph, foretells its heat at 50 °C within 0.6 % of Qmax', async () => {
    const { result } = await readWithFit(clickedDocument(['d06', 'd07'], { count: 8, scatterPx: 0.5, seed: 74 }), blankHost);
    expect(missOf(moduleOf(result.model!), 'd05', 'heat')).toBeLessThan(0.6);
  });
});

describe('the forms fitted to the exact curves', () => {
  it('are nested: each foretells the unseen hot side better than the one before', async () => {
    const { observations } = await readWithFit(clickedDocument(['d01', 'd03'], { count: 25, scatterPx: 0, seed: 1 }), blankHost);
    const miss = (['constant', 'shaped', 'leg'] as const).map((form) => {
      const outcome = fitForm(form, observations);
      if (!outcome.ok) throw new Error(outcome.missing);
      return missOf(moduleOfFit(outcome.fit as ModuleFit), 'd02', 'heat');
    });
    expect(miss[1]).toBeLessThan(miss[0]!);
    expect(miss[2]).toBeLessThan(miss[1]!);
  });
});
