import type { ThermoelectricModule } from '@/lib/module';
import { moduleOf, read, type ReadingResult } from '@/lib/reading';
import { intake } from '@/lib/server/pictures/intake';
import { kelvin } from '@/lib/units';
import type { Made } from './plan';
import type { DrawnReading, DrawnSheet } from './sheet';
import { ZERO_CELSIUS } from './truth';

/** How far the model of one reading is from the points that were clicked, and from the truth behind the drawing. Percent. */
export interface Misfit {
  readonly reading: DrawnReading;
  readonly points: number;
  readonly pointsHeat: number | null;
  readonly pointsVoltage: number | null;
  readonly truthHeat: number;
  readonly truthVoltage: number;
  /** Ratings that follow from the model over the true ones, at the first hot side. */
  readonly ratings: { readonly imax: number; readonly qmax: number; readonly dTmax: number; readonly vmax: number };
}

const rms = (values: readonly number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

const CURRENTS = [0.2, 0.4, 0.6, 0.8, 1];
const DIFFERENCES = [0, 0.2, 0.4, 0.6, 0.8, 1];

/** Model less truth at one hot side: five currents up to Imax, six differences from none to where no heat is pumped any more. */
function gapsAt(side: number, { truth }: Made, model: ThermoelectricModule) {
  const { imaxLargestDeltaT, qmaxLargestDeltaT, vmaxV } = truth.ratings(side);
  const hot = kelvin(side + ZERO_CELSIUS);
  return CURRENTS.flatMap((part) => {
    const current = part * imaxLargestDeltaT;
    const reach = truth.reach(current, side);
    return DIFFERENCES.map((share) => {
      const deltaT = share * reach;
      const cold = kelvin(hot - deltaT);
      return {
        heat: (model.heat(current, cold, hot) - truth.heat(current, side, deltaT)) / qmaxLargestDeltaT,
        voltage: (model.voltage(current, cold, hot) - truth.voltage(current, side, deltaT)) / vmaxV,
      };
    });
  });
}

async function resultOf(sheet: DrawnSheet, { document }: DrawnReading): Promise<ReadingResult> {
  const picture = async (image: string) => {
    const file = sheet.pictures.find(({ name }) => name === image);
    if (!file) throw new Error(`${sheet.plan.slug} has no picture ${image}.`);
    return intake(file.bytes).then(({ width, height, fileSha256, pixelsSha256 }) => ({ width, height, fileSha256, pixelsSha256 }));
  };
  return read(document, { picture });
}

/** Reads one document as the product does and holds its model against points and truth. */
export async function misfitOf(sheet: DrawnSheet, reading: DrawnReading): Promise<Misfit> {
  const { model, modelMissing } = await resultOf(sheet, reading);
  if (!model) throw new Error(`${reading.name}: ${modelMissing}`);
  const sides = [...new Set(reading.document.charts.map(({ hotSideC }) => hotSideC ?? 27))];
  const gaps = sides.flatMap((side) => gapsAt(side, reading.made, moduleOf(model)));
  const implied = model.derived.find(({ hotSideC }) => hotSideC === sides[0]);
  const real = reading.made.truth.ratings(sides[0] ?? 27);
  const over = (value: number | undefined, truth: number) => (value ?? NaN) / truth;
  return {
    reading,
    ratings: {
      imax: over(implied?.imaxLargestDeltaT.value, real.imaxLargestDeltaT),
      qmax: over(implied?.qmaxW.value, real.qmaxLargestDeltaT),
      dTmax: over(implied?.dTmaxK.value, real.dTmaxK),
      vmax: over(implied?.vmaxV.value, real.vmaxV),
    },
    points: reading.document.charts.flatMap(({ curves = [] }) => curves.flatMap(({ points = [] }) => points)).length,
    pointsHeat: model.rmsPercentOfQmax,
    pointsVoltage: model.rmsPercentOfVmax,
    truthHeat: 100 * rms(gaps.map(({ heat }) => heat)),
    truthVoltage: 100 * rms(gaps.map(({ voltage }) => voltage)),
  };
}

const percent = (value: number | null) => (value === null ? '–' : value.toFixed(2));

/** The misfits as a table of Markdown, and their middle and worst. */
export function misfitTable(misfits: readonly Misfit[]): string {
  const row = ({ reading: { made, document }, points, ...misfit }: Misfit) => {
    const sides = [...new Set(document.charts.map(({ hotSideC }) => `${hotSideC} °C`))].join(', ');
    const name = [made.body.partNumber, made.body.variant].filter(Boolean).join(' ');
    const numbers = [misfit.pointsHeat, misfit.pointsVoltage, misfit.truthHeat, misfit.truthVoltage].map(percent);
    return `| ${[made.body.vendor, name, sides, document.charts.length, points, ...numbers].join(' | ')} |`;
  };
  const ordered = (values: readonly number[]) => [...values].sort((a, b) => a - b);
  const middle = (values: readonly number[]) => ordered(values)[Math.floor(values.length / 2)] ?? NaN;
  const spread = (key: 'truthHeat' | 'truthVoltage') => {
    const values = misfits.map((misfit) => misfit[key]);
    return `${percent(middle(values))} % in the middle, ${percent(Math.max(...values))} % at worst`;
  };
  const implied = (key: keyof Misfit['ratings']) => percent(middle(misfits.map(({ ratings }) => ratings[key])));
  return [
    '| vendor | module | hot sides | charts | points | heat, of points | voltage, of points | heat, of truth | voltage, of truth |',
    '| --- | --- | --- | ---: | ---: | ---: | ---: | ---: | ---: |',
    ...misfits.map(row),
    '',
    `Against the truth, heat: ${spread('truthHeat')}. Voltage: ${spread('truthVoltage')}.`,
    `Ratings that follow from the models over the true ones, in the middle: Imax ${implied('imax')}, Qmax ${implied('qmax')}, ΔTmax ${implied('dTmax')}, Vmax ${implied('vmax')}.`,
  ].join('\n');
}
