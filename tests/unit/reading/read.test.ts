import { describe, expect, it } from 'vitest';
import { ENGINE, hashMaterial, PictureRefused, read, ReadingRefused, readWithFit, type Picture, type ReadingResult } from '@/lib/reading';
import { blankHost } from '../../support/charts';
import { cornerMarks, documentOf, heatAt, heatChart, KNOWN, pixelOf, plainDocument, voltageChart } from './documents';

const readJson = (json: unknown): Promise<ReadingResult> => read(documentOf(json), blankHost);

async function refusal(
  json: unknown,
  host: { picture: (image: string) => Promise<Picture> } = blankHost,
): Promise<{ path: string; message: string }> {
  try {
    await read(documentOf(json), host);
  } catch (error) {
    if (error instanceof ReadingRefused) return { path: error.path, message: error.message };
    throw error;
  }
  throw new Error('the document was read');
}

describe('the result of a document of marks and points', () => {
  it('gives every point its values in the units of the chart', async () => {
    const result = await readJson(plainDocument());
    expect(result).toMatchObject({ format: 'couplet.result', version: 1, engine: ENGINE, modelMissing: null, checks: [] });
    const [chart] = result.charts;
    expect(chart).toMatchObject({ image: 'chart.png', pixelsSha256: 'a'.repeat(64), fileSha256: 'f'.repeat(64) });
    expect(chart!.frame).toEqual({ kind: 'upright', marks: cornerMarks(60, 50), residualPx: null });
    const [curve] = chart!.curves;
    expect(curve).toMatchObject({ value: 2, by: 'hand', gaps: [], doubts: [] });
    expect(curve!.points[2]).toEqual({ px: pixelOf(20, heatAt(27)(2, 20), 60, 50), x: 20, y: expect.closeTo(heatAt(27)(2, 20), 9) });
  });

  it('keeps how the points of a curve were made', async () => {
    const chart = heatChart();
    const curves = (chart['curves'] as object[]).map((curve, at) => ({
      ...curve,
      ...(at === 0 ? {} : { by: at === 1 ? 'followed' : 'path' }),
    }));
    const result = await readJson(plainDocument([{ ...chart, curves }]));
    expect(result.charts[0]!.curves.map(({ by }) => by)).toEqual(['hand', 'followed', 'path']);
  });

  it('finds the module that drew the charts', async () => {
    const { model } = await readJson(plainDocument());
    expect(model).toMatchObject({ form: 'constant', grade: 'curves', at: 'effective', temperature: { alphaPerK: 0, RPerK: 0, KPerK: 0 } });
    expect(model!.alpha).toEqual({ value: expect.closeTo(KNOWN.alpha, 8), u: expect.any(Number), unit: 'V/K' });
    expect(model!.R.value).toBeCloseTo(KNOWN.R, 6);
    expect(model!.K.value).toBeCloseTo(KNOWN.K, 6);
    expect(model!.parameters.map(({ name, unit }) => `${name} ${unit}`)).toEqual(['alpha V/K', 'R ohm', 'K W/K']);
    expect(model!.parameters.map(({ value }) => value)).toEqual([model!.alpha.value, model!.R.value, model!.K.value]);
    model!.covariance.forEach((row, at) => expect(Math.sqrt(row[at]!)).toBeCloseTo([model!.alpha, model!.R, model!.K][at]!.u, 9));
    expect(model!.rmsPercentOfQmax).toBeCloseTo(0, 6);
    expect(model!.rmsPercentOfVmax).toBeCloseTo(0, 6);
  });

  it('says where the sheet says anything', async () => {
    const { model } = await readJson(plainDocument());
    expect(model!.validity).toEqual({ I: [0, 4], deltaT: [0, 40], hotSideC: [17, 37] });
  });

  it('derives ratings for the hot side of every chart and every rating, coldest first, each once', async () => {
    const rated = [
      { hotSideC: 50, tolerancePercent: 10 },
      { hotSideC: 27, tolerancePercent: 15 },
    ];
    const { model } = await readJson(plainDocument(undefined, { module: { vendor: 'x', partNumber: 'y', rated } }));
    expect(model!.derived.map(({ hotSideC }) => hotSideC)).toEqual([27, 50]);
    // Vmax = α Th (physics of a constant module, exact)
    expect(model!.derived[1]!.vmaxV.value).toBeCloseTo(KNOWN.alpha * 323.15, 6);
    expect(Object.keys(model!.derived[0]!)).toEqual(['hotSideC', 'imaxLargestDeltaT', 'imaxMostHeat', 'qmaxW', 'dTmaxK', 'vmaxV', 'Z']);
    expect(model!.tolerancePercent).toBe(15);
  });

  it('states no tolerance where the sheet states none', async () => {
    const { model, predictions } = await readJson(plainDocument(undefined, { predict: [{ hotSideC: 27, deltaT: 20, I: 3 }] }));
    expect(model!.tolerancePercent).toBeNull();
    expect(predictions[0]).toMatchObject({ Qc: { tolerance: null } });
  });

  it('is the same to the last byte every time', async () => {
    const json = plainDocument(undefined, { predict: [{ hotSideC: 30, deltaT: 12, V: 6 }] });
    expect(JSON.stringify(await readJson(json))).toBe(JSON.stringify(await readJson(json)));
  });

  it('has the keys of the contract in their order', async () => {
    const result = await readJson(plainDocument());
    expect(Object.keys(result)).toEqual(['format', 'version', 'engine', 'charts', 'model', 'modelMissing', 'predictions', 'checks']);
    expect(Object.keys(result.charts[0]!)).toEqual(['image', 'fileSha256', 'pixelsSha256', 'frame', 'curves']);
    expect(Object.keys(result.model!)).toEqual([
      'form',
      'grade',
      'at',
      'alpha',
      'R',
      'K',
      'temperature',
      'parameters',
      'covariance',
      'rmsPercentOfQmax',
      'rmsPercentOfVmax',
      'tolerancePercent',
      'validity',
      'derived',
      'choice',
    ]);
  });

  it('comes with the fit, its observations and its frames for those who ask', async () => {
    const { fit, observations, frames } = await readWithFit(documentOf(plainDocument()), blankHost);
    expect(frames.map(({ kind }) => kind)).toEqual(['upright', 'upright']);
    expect(observations).toHaveLength(30);
    expect(fit!.residuals.map(({ chart, curve, point }) => [chart, curve, point])[17]).toEqual([1, 0, 2]);
  });
});

describe('predictions', () => {
  const predictAll = async (...predict: object[]) => (await readJson(plainDocument(undefined, { predict }))).predictions;

  it('keep the order and length asked, and answer in base units', async () => {
    const predictions = await predictAll({ hotSideC: 30, deltaT: 25, I: 3 }, { hotSideC: 27, deltaT: 10, I: 2 });
    expect(predictions).toHaveLength(2);
    expect(Object.keys(predictions[0]!)).toEqual(['hotSideC', 'deltaT', 'I', 'inside', 'Qc', 'Qh', 'V', 'P', 'COP']);
    expect(predictions[0]).toMatchObject({ hotSideC: 30, deltaT: 25, I: 3, inside: true });
    const Qc = heatAt(30)(3, 25);
    const V = 0.05 * 25 + 2 * 3;
    expect(predictions[0]).toMatchObject({
      Qc: { value: expect.closeTo(Qc, 6), uRead: expect.any(Number), tolerance: null },
      Qh: { value: expect.closeTo(Qc + 3 * V, 6) },
      V: { value: expect.closeTo(V, 6) },
      P: { value: expect.closeTo(3 * V, 6) },
      COP: { value: expect.closeTo(Qc / (3 * V), 6) },
    });
  });

  it('take a voltage in place of the current, and then answer the current', async () => {
    const [prediction] = await predictAll({ hotSideC: 30, deltaT: 25, V: 7.25 });
    expect(prediction).toMatchObject({ V: 7.25, I: { value: expect.closeTo(3, 6) }, Qc: { value: expect.closeTo(heatAt(30)(3, 25), 5) } });
  });

  it('take a cold side in place of the hot side', async () => {
    const [prediction] = await predictAll({ coldSideC: 5, deltaT: 25, I: 3 });
    expect(prediction).toMatchObject({ coldSideC: 5, Qc: { value: expect.closeTo(heatAt(30)(3, 25), 6) } });
    expect(prediction).not.toHaveProperty('hotSideC');
  });

  it.each([
    ['a current above every curve', { hotSideC: 27, deltaT: 20, I: 4.1 }],
    ['a difference beyond every curve', { hotSideC: 27, deltaT: 41, I: 3 }],
    ['a hot side far from every chart', { hotSideC: 50, deltaT: 20, I: 3 }],
    ['a voltage that drives too much current', { hotSideC: 27, deltaT: 20, V: 10 }],
  ])('mark %s as outside', async (_, asked) => {
    expect((await predictAll(asked))[0]).toMatchObject({ inside: false });
  });

  it('count the ends of the ranges as inside', async () => {
    expect((await predictAll({ hotSideC: 27, deltaT: 40, I: 4 }))[0]).toMatchObject({ inside: true });
  });

  it('have no COP where the module generates', async () => {
    expect((await predictAll({ hotSideC: 27, deltaT: 40, I: -0.5 }))[0]).toMatchObject({ COP: null });
  });

  it('say what is missing when there is no model', async () => {
    const json = plainDocument([heatChart({ values: [2] })], { predict: [{ hotSideC: 27, deltaT: 20, I: 3 }] });
    const result = await readJson(json);
    expect(result.model).toBeNull();
    expect(result.modelMissing).toMatch(/One current of heat alone cannot tell Seebeck coefficient from resistance/);
    expect(result.predictions).toEqual([{ hotSideC: 27, deltaT: 20, I: 3, missing: result.modelMissing }]);
  });
});

describe('a document without points', () => {
  it('has charts but no model, and says what to do', async () => {
    const result = await readJson(plainDocument([{ ...heatChart(), curves: [] }]));
    expect(result.charts[0]!.curves).toEqual([]);
    expect(result.modelMissing).toMatch(/put points on its curves/);
  });
});

describe('a document is refused', () => {
  const heatWith = (changes: object) => plainDocument([voltageChart(), { ...heatChart(), ...changes }]);

  it.each<[string, string, object, RegExp]>([
    [
      'a curve to be followed without pixels',
      'charts[1].image',
      heatWith({ curves: [{ value: 1, start: [200, 300] }] }),
      /pixels of this picture are not at hand/,
    ],
    ['marks to be found', 'charts[1].marks', heatWith({ marks: undefined }), /does not find the frame/],
    ['curves to be found', 'charts[1].curves', heatWith({ curves: undefined }), /does not find the curves/],
    ['ratings', 'model.use[1]', plainDocument(undefined, { model: { use: ['curves', 'ratings'] } }), /curves only, not ratings/],
    ['the AC resistance', 'model.use[0]', plainDocument(undefined, { model: { use: ['acResistance'] } }), /curves only, not acResistance/],
  ])('when it asks what cannot be done yet: %s', async (_, path, json, message) => {
    const refused = await refusal(json);
    expect(refused.path).toBe(path);
    expect(refused.message).toMatch(message);
  });

  it('but not for a start that only keeps a record beside the points', async () => {
    const chart = heatChart();
    const curves = (chart['curves'] as object[]).map((curve) => ({ ...curve, start: [1, 1], through: [[2, 2]], by: 'followed' }));
    expect((await readJson(plainDocument([{ ...chart, curves }, voltageChart()]))).model).not.toBeNull();
  });

  it.each<[string, string, object]>([
    ['a mark', 'charts[1].marks[2].px', heatWith({ marks: [...cornerMarks(60, 50).slice(0, 2), { px: [62, 720.1], y: 50 }] })],
    [
      'a point',
      'charts[1].curves[0].points[1]',
      heatWith({
        curves: [
          {
            value: 1,
            points: [
              [200, 300],
              [1000.1, 300],
            ],
          },
        ],
      }),
    ],
    ['a negative pixel', 'charts[1].marks[0].px', heatWith({ marks: [{ px: [-0.1, 5], x: 0 }] })],
  ])('when %s lies outside the picture', async (_, path, json) => {
    expect(await refusal(json)).toEqual({ path, message: 'This pixel lies outside the picture, which is 1000 pixels wide and 720 high.' });
  });

  it('when the marks make no frame, with the sentence of the frame', async () => {
    const [origin, right, top] = cornerMarks(60, 50);
    expect(await refusal(heatWith({ marks: [origin, right] }))).toMatchObject({
      path: 'charts[1].marks',
      message: expect.stringContaining('Only one mark has a y value'),
    });
    expect(await refusal(heatWith({ marks: [origin, { px: right!.px }, top] }))).toMatchObject({
      path: 'charts[1].marks[1]',
      message: expect.stringContaining('Mark 2'),
    });
    const x = { quantity: 'deltaT', unit: 'K', scale: 'log' };
    expect(await refusal(heatWith({ x }))).toMatchObject({
      path: 'charts[1].marks[0]',
      message: expect.stringContaining('a logarithmic axis does not reach'),
    });
  });

  it('when a point says that a side is below absolute zero', async () => {
    const marks = cornerMarks(600, 50);
    expect(await refusal(heatWith({ marks }))).toMatchObject({
      path: 'charts[1].curves[0].points[4]',
      message: expect.stringContaining('absolute zero'),
    });
  });

  it('when its picture is refused, at the image', async () => {
    const host = {
      picture: (image: string) => (image === 'no.png' ? Promise.reject(new PictureRefused('No such picture.')) : blankHost.picture()),
    };
    expect(await refusal(heatWith({ image: 'no.png' }), host)).toEqual({ path: 'charts[1].image', message: 'No such picture.' });
  });
});

describe('pictures', () => {
  it('shared by charts are asked for once', async () => {
    const asked: string[] = [];
    const host = { picture: (image: string) => (asked.push(image), blankHost.picture()) };
    await read(documentOf(plainDocument([heatChart(), voltageChart(), { ...heatChart(), image: 'b.png' }])), host);
    expect(asked).toEqual(['chart.png', 'b.png']);
  });

  it('that fail for another reason are no refusal', async () => {
    const host = { picture: () => Promise.reject(new TypeError('disk')) };
    await expect(read(documentOf(plainDocument()), host)).rejects.toThrow(TypeError);
  });
});

describe('what an approval is the hash of', () => {
  it('is document, pixels, model and engine', async () => {
    const document = documentOf(plainDocument());
    const { model } = await read(document, blankHost);
    expect(hashMaterial(document, ['a', 'b'], model, ENGINE)).toEqual({ document, pixelsSha256: ['a', 'b'], model, engine: '1.1.0' });
  });
});
