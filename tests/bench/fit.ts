import { cpus } from 'node:os';
import { fitBest, fitForm, moduleOfFit, type ModuleFit, type Observation } from '@/lib/fit';
import { MODEL_FORMS, responseOf, type ModelForm, type ThermoelectricModule } from '@/lib/module';
import { readWithFit, type ReadingDocument } from '@/lib/reading';
import { kelvin } from '@/lib/units';
import { blankHost, clickedDocument, truthOf } from '../support/charts';
import { FINE_CONSTANTS } from '../support/fine-leg';

/** The fits of drawings whose exact curves are known, for each form: what is missed in the sheet and at a hot side that no chart shows, and how long it takes. */

const rms = (values: readonly number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

/** Root mean square of model less exact curve of heat or voltage over ΔT, percent of the module's Qmax or Vmax at that hot side. */
function missOf(module: ThermoelectricModule, name: string, answer: 'heat' | 'voltage'): number {
  const { hotSideC, curves, Qmax, Vmax } = truthOf(name);
  const Th = kelvin(hotSideC + 273.15);
  const errors = curves.flatMap(({ value, x, y }) => x.map((dT, i) => module[answer](value, kelvin(Th - dT), Th) - y[i]!));
  return (100 * rms(errors)) / (answer === 'heat' ? Qmax : Vmax);
}

interface Case {
  readonly title: string;
  readonly charts: readonly string[];
  /** What is measured: a drawing, what it shows, and whether the fit saw it. */
  readonly heat: string;
  readonly voltage: string | null;
  readonly unseen: string | null;
}

const CASES: readonly Case[] = [
  { title: 'E: d01 + d03, unseen d02', charts: ['d01', 'd03'], heat: 'd01', voltage: 'd03', unseen: 'd02' },
  { title: 'E: d01 + d02 + d03', charts: ['d01', 'd02', 'd03'], heat: 'd02', voltage: 'd03', unseen: null },
  { title: 'F: d06 + d07, unseen d05', charts: ['d06', 'd07'], heat: 'd06', voltage: 'd07', unseen: 'd05' },
];

const SEEDS = [1, 2, 3, 4, 5];
/** Clicks on each curve: with five curves a chart, 300 points of two charts. */
const CLICKS = 30;

async function observationsOf(charts: readonly string[], seed: number, count: number): Promise<readonly Observation[]> {
  const document: ReadingDocument = { ...clickedDocument(charts, { count, scatterPx: 0.5, seed: 10 * seed }), model: { form: 'constant' } };
  return (await readWithFit(document, blankHost)).observations;
}

const median = (values: readonly number[]) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;

function fitted(form: ModelForm | 'auto', observations: readonly Observation[]): ModuleFit {
  if (form !== 'auto') {
    const outcome = fitForm(form, observations);
    if (!outcome.ok) throw new Error(outcome.missing);
    return outcome.fit;
  }
  const best = fitBest(observations);
  if ('ok' in best) throw new Error(best.missing);
  return best.outcome.fit;
}

/** Median and least time of one call, ms, once the engine has compiled it. */
function timed(call: () => unknown, times: number): readonly [median: number, least: number] {
  for (let i = 0; i < Math.ceil(times / 4); i += 1) call();
  const taken = Array.from({ length: times }, () => {
    const start = performance.now();
    call();
    return performance.now() - start;
  });
  return [median(taken), Math.min(...taken)];
}

const FORMS = [...MODEL_FORMS, 'auto'] as const;
const percent = (value: number | null) => (value === null ? '–' : value.toFixed(3));

async function accuracy(): Promise<string[]> {
  const rows: string[] = [];
  for (const { title, charts, heat, voltage, unseen } of CASES) {
    const read = await Promise.all(SEEDS.map((seed) => observationsOf(charts, seed, CLICKS)));
    for (const form of FORMS) {
      const fits = read.map((observations) => fitted(form, observations));
      const worst = (name: string | null, answer: 'heat' | 'voltage') =>
        name === null ? null : Math.max(...fits.map((fit) => missOf(moduleOfFit(fit), name, answer)));
      const numbers = [worst(heat, 'heat'), worst(voltage, 'voltage'), worst(unseen, 'heat')].map(percent);
      const chosen = form === 'auto' ? ` (${[...new Set(fits.map((fit) => fit.form))].join(', ')})` : '';
      rows.push(`| ${title} | ${form}${chosen} | ${numbers.join(' | ')} |`);
    }
  }
  return rows;
}

async function times(): Promise<string[]> {
  const observations = await observationsOf(['d01', 'd03'], 1, CLICKS);
  const rows = FORMS.map((form) => {
    const [middle, least] = timed(() => fitted(form, observations), form === 'auto' ? 15 : 40);
    return `| fit, ${observations.length} points, ${form} | ${middle.toFixed(1)} | ${least.toFixed(1)} |`;
  });
  const [middle, least] = timed(() => {
    for (let i = 0; i < 1000; i += 1) responseOf('leg', FINE_CONSTANTS, 1 + i / 150, 240 + i / 20, 300);
  }, 20);
  return [...rows, `| 1000 states of the leg form with derivatives | ${middle.toFixed(1)} | ${least.toFixed(1)} |`];
}

/** Measures the fits and returns the tables as Markdown. */
export async function run(): Promise<string> {
  const day = new Date().toISOString().slice(0, 10);
  return [
    `Fits of drawn charts, ${CLICKS} clicks a curve off by 0.5 px, the worst of ${SEEDS.length} seeds; rms in percent of Qmax and Vmax. Measured ${day}.`,
    '',
    '| charts | form | heat, in the sheet | voltage, in the sheet | heat, unseen hot side |',
    '| --- | --- | ---: | ---: | ---: |',
    ...(await accuracy()),
    '',
    `| on one of ${cpus().length} cores | median ms | least ms |`,
    '| --- | ---: | ---: |',
    ...(await times()),
  ].join('\n');
}
