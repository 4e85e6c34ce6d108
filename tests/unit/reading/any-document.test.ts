import * as fc from 'fast-check';
import { expect, it } from 'vitest';
import { parseReadingDocument, read, ReadingRefused } from '@/lib/reading';
import { blankHost } from '../../support/charts';
import { heatChart, plainDocument, voltageChart } from './documents';

type Path = readonly (string | number)[];

/** Every place in plain data that holds a number or a word. */
function leaves(value: unknown, path: Path = []): Path[] {
  if (typeof value !== 'object' || value === null) return [path];
  return Object.entries(value).flatMap(([key, inner]) => leaves(inner, [...path, Array.isArray(value) ? Number(key) : key]));
}

function put(json: unknown, path: Path, value: unknown): unknown {
  const copy = structuredClone(json) as Record<string, unknown>;
  let at = copy;
  for (const step of path.slice(0, -1)) at = at[step] as Record<string, unknown>;
  at[String(path.at(-1))] = value;
  return copy;
}

const start = plainDocument([heatChart(), voltageChart()], {
  predict: [
    { hotSideC: 27, deltaT: 20, I: 3 },
    { coldSideC: 5, deltaT: 20, V: 6 },
  ],
});
const places = leaves(start).filter((path) => path[0] !== 'format');

const odd = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.double({ min: -1000, max: 1000, noNaN: true }),
  fc.integer({ min: -2, max: 2 }),
  fc.constantFrom<unknown>(
    'I',
    'V',
    'deltaT',
    'Tc',
    'Th',
    'Qc',
    'Qh',
    'P',
    'COP',
    'K',
    'C',
    'F',
    'mW',
    '1',
    '%',
    'log',
    null,
    [],
    {},
    true,
  ),
);

const holdsNonsense = (json: string) =>
  /null/.test(json.replace(/"(?:residualPx|tolerance|tolerancePercent|modelMissing|model|COP|rmsPercentOf[QV]max)":null/g, ''));

it('any spoiled document is refused with a path and a sentence, or gives a result without a hole', async () => {
  let results = 0;
  await fc.assert(
    fc.asyncProperty(fc.array(fc.tuple(fc.constantFrom(...places), odd), { minLength: 1, maxLength: 3 }), async (hits) => {
      let json: unknown = start;
      try {
        for (const [path, value] of hits) json = put(json, path, value);
      } catch {
        return;
      }
      const parsed = parseReadingDocument(json);
      if (!parsed.ok) {
        expect(parsed.message).toMatch(/\.$/);
        return;
      }
      const outcome = await read(parsed.document, blankHost).catch((error: unknown) => error);
      if (outcome instanceof ReadingRefused) {
        expect(outcome.message).toMatch(/^[A-Z].*\.$/);
        return;
      }
      if (outcome instanceof Error) throw outcome;
      results += 1;
      // JSON writes what is not finite as null
      expect(holdsNonsense(JSON.stringify(outcome))).toBe(false);
    }),
    { numRuns: 300 },
  );
  expect(results).toBeGreaterThan(10);
});
