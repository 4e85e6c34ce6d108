import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { searchDuty, type Candidate, type Duty } from '@/lib/duty';
import { constantsOf } from '@/lib/fit';
import { parseReadingDocument, readWithFit } from '@/lib/reading';
import { uniforms } from '../support/random';

const MODULES = 2000;
const RUNS = 20;

/** Models of the demo's modules, read from their documents; the search is timed on scaled copies of them. */
async function models(): Promise<Candidate[]> {
  const files = readdirSync('samples/sheets', { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.reading.json'));
  const candidates = await Promise.all(files.map(async (file) => candidateOf(path.join('samples/sheets', file))));
  return candidates.filter((candidate) => candidate !== null);
}

async function candidateOf(file: string): Promise<Candidate | null> {
  const parsed = parseReadingDocument(JSON.parse(readFileSync(file, 'utf8')));
  if (!parsed.ok) return null;
  const size = { width: 4000, height: 4000, fileSha256: '', pixelsSha256: '' };
  const { result, fit } = await readWithFit(parsed.document, { picture: async () => size });
  if (!fit || !result.model) return null;
  const { alpha, R, K } = constantsOf(fit);
  const { covariance, misfit } = fit;
  const model = {
    form: fit.form,
    parameters: [alpha, R, K] as const,
    covariance,
    misfit,
    tolerancePercent: 10,
    validity: result.model.validity,
  };
  return { model, maxTemperatureC: 120, allowedCurrentA: null };
}

/** More couples and other legs: α, R and K scaled together. */
function scaled({ model, ...rest }: Candidate, couples: number, leg: number): Candidate {
  const factors = [couples, couples * leg, couples / leg] as const;
  const [alpha, R, K] = model.parameters;
  const covariance = model.covariance.map((row, i) => row.map((value, j) => value * (factors[i] ?? 1) * (factors[j] ?? 1)));
  return { ...rest, model: { ...model, parameters: [alpha * factors[0], R * factors[1], K * factors[2]], covariance } };
}

const quantile = (sorted: readonly number[], share: number) =>
  sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? NaN;

/** Times the pure search over many modules on duties that most, some and none of them meet. */
export async function run(): Promise<string> {
  const random = uniforms(20261201);
  const between = (low: number, high: number) => low + (high - low) * random();
  const seeds = await models();
  const candidates = Array.from({ length: MODULES }, (_, at) => scaled(seeds[at % seeds.length]!, between(0.3, 3), between(0.4, 2.5)));
  const duties: Record<string, () => Duty> = {
    'easy: 0.2 to 5 W over 5 to 30 K': () => ({ heatW: between(0.2, 5), coldFaceC: 20, hotFaceC: 20 + between(5, 30) }),
    'usual: 5 to 40 W over 20 to 50 K': () => ({
      heatW: between(5, 40),
      coldFaceC: between(-5, 10),
      hotFaceC: between(30, 45),
      maxCurrentA: 8,
      maxVoltageV: 24,
    }),
    'met by none: 500 to 900 W over 60 K': () => ({ heatW: between(500, 900), coldFaceC: -20, hotFaceC: 40 }),
  };
  const rows = Object.entries(duties).map(([mix, make]) => {
    const times = Array.from({ length: RUNS }, () => {
      const duty = make();
      const from = performance.now();
      const { matches } = searchDuty(duty, candidates);
      return { ms: performance.now() - from, matches: matches.length };
    });
    const sorted = times.map(({ ms }) => ms).sort((a, b) => a - b);
    const met = times.reduce((sum, { matches }) => sum + matches, 0) / RUNS;
    return `| ${mix} | ${Math.round(met)} | ${quantile(sorted, 0.5).toFixed(1)} | ${quantile(sorted, 0.95).toFixed(1)} |`;
  });
  return [
    `Duty search, first cut: ${MODULES.toLocaleString('en')} modules (scaled copies of ${seeds.length} read ones), faces given, one module, exact rows with uncertainty; ${RUNS} duties of each kind.`,
    '',
    '| duties | met by, on average | median ms | 95th percentile ms |',
    '| --- | ---: | ---: | ---: |',
    ...rows,
  ].join('\n');
}
