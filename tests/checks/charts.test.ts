import { describe, expect, it } from 'vitest';
import { constantsOf } from '@/lib/fit';
import { toValue, type FrameKind } from '@/lib/geometry';
import { constantModule } from '@/lib/module';
import { readWithFit } from '@/lib/reading';
import { kelvin } from '@/lib/units';
import { blankHost, clickedDocument, documentOf, frameOf, truthOf, type Truth } from '../support/charts';

// Truth: tests/fixtures/charts, drawn from a one-dimensional solution of the leg heat equation (see the README there).

describe('the frame of a drawn chart', () => {
  it.each<[string, FrameKind, string]>([
    ['d01', 'upright', 'a clean drawing'],
    ['d04', 'upright', 'a clean drawing'],
    ['d06', 'turned', 'a scan laid down askew'],
    ['d07', 'perspective', 'a photograph'],
    ['d09', 'upright', 'a clean drawing'],
  ])('of %s is %s: %s', (name, kind) => {
    expect(frameOf(documentOf(name).charts[0]!).kind).toBe(kind);
  });

  it.each(['d01', 'd03', 'd05', 'd06', 'd07', 'd08', 'd10'])('of %s reads the start of every curve as a value on that curve', (name) => {
    const chart = documentOf(name).charts[0]!;
    const frame = frameOf(chart);
    const { curves } = truthOf(name);
    const heights = chart.marks!.flatMap(({ y }) => y ?? []);
    for (const [at, { start }] of chart.curves!.entries()) {
      const [x, y] = toValue(frame, start!);
      // starts are given to 0.001 px; curves are straight between their points to a small part of a per cent
      expect(Math.abs(y - yAt(curves[at]!, x)) / Math.max(...heights)).toBeLessThan(5e-4);
    }
  });
});

/** Value of a true curve between its points. */
function yAt({ x, y }: Truth['curves'][number], at: number): number {
  const next = Math.max(
    1,
    x.findIndex((value) => value >= at),
  );
  const [x0, x1, y0, y1] = [x[next - 1]!, x[next]!, y[next - 1]!, y[next]!];
  return y0 + ((at - x0) / (x1 - x0)) * (y1 - y0);
}

const rms = (values: readonly number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

describe('d01 and d03 clicked by hand, off by half a pixel', () => {
  it.each([11, 12, 13, 14, 15])(
    'with seed %i give a model within 1.5 per cent of Qmax of the heat and 5 per cent of Vmax of the voltage',
    async (seed) => {
      const { fit } = await readWithFit(clickedDocument(['d01', 'd03'], { count: 8, scatterPx: 0.5, seed }), blankHost);
      const module = constantModule(constantsOf(fit!));
      const [heat, voltage] = [truthOf('d01'), truthOf('d03')];
      const Th = kelvin(heat.hotSideC + 273.15);
      const errors = (truth: Truth, answer: (I: number, dT: number) => number) =>
        truth.curves.flatMap(({ value, x, y }) => x.map((dT, at) => answer(value, dT) - y[at]!));
      const heatErrors = errors(heat, (I, dT) => module.heat(I, kelvin(Th - dT), Th));
      const voltageErrors = errors(voltage, (I, dT) => module.voltage(I, kelvin(Th - dT), Th));
      expect(rms(heatErrors) / heat.Qmax).toBeLessThan(0.015);
      expect(rms(voltageErrors) / voltage.Vmax).toBeLessThan(0.05);
    },
  );

  it('imply the ratings of the module', async () => {
    const { result } = await readWithFit(clickedDocument(['d01', 'd03'], { count: 8, scatterPx: 0.5, seed: 21 }), blankHost);
    const { Qmax, dTmax, Vmax } = truthOf('d01');
    const derived = result.model!.derived.find(({ hotSideC }) => hotSideC === 27)!;
    expect(Math.abs(derived.qmaxW.value / Qmax - 1)).toBeLessThan(0.03);
    expect(Math.abs(derived.dTmaxK.value / dTmax - 1)).toBeLessThan(0.03);
    expect(Math.abs(derived.vmaxV.value / Vmax - 1)).toBeLessThan(0.05);
  });
});

describe('the other drawn charts clicked by hand', () => {
  it('of module F, a turned scan and a photograph in perspective, give a model', async () => {
    const { result } = await readWithFit(clickedDocument(['d06', 'd07'], { count: 8, scatterPx: 0.5, seed: 31 }), blankHost);
    expect(result.charts.map(({ frame }) => frame.kind)).toEqual(['turned', 'perspective']);
    expect(result.model!.rmsPercentOfQmax).toBeLessThan(1.5);
    expect(result.model!.rmsPercentOfVmax).toBeLessThan(5);
    const { Qmax } = truthOf('d06');
    expect(Math.abs(result.model!.derived[0]!.qmaxW.value / Qmax - 1)).toBeLessThan(0.03);
  });

  it('of module G, COP over temperature difference with heat over current, give a model', async () => {
    const { result } = await readWithFit(clickedDocument(['d08', 'd09'], { count: 8, scatterPx: 0.5, seed: 41 }), blankHost);
    const { Qmax } = truthOf('d09');
    expect(Math.abs(result.model!.derived[0]!.qmaxW.value / Qmax - 1)).toBeLessThan(0.05);
  });

  it('of COP alone give no model but a sentence that names the chart that is missing', async () => {
    const { result } = await readWithFit(clickedDocument(['d08', 'd10'], { count: 8, scatterPx: 0.5, seed: 51 }), blankHost);
    expect(result.model).toBeNull();
    expect(result.modelMissing).toMatch(/COP alone gives only ratios.*add a chart of heat/);
  });
});
