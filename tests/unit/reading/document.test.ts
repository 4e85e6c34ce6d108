import { describe, expect, it } from 'vitest';
import { parseReadingDocument } from '@/lib/reading';
import { documentOf as drawn } from '../../support/charts';
import { documentOf, heatChart, plainDocument, refusalOf, voltageChart } from './documents';

const module = { vendor: 'Invented', partNumber: 'T' };
const chartWith = (changes: object) => plainDocument([{ ...heatChart(), ...changes }]);

describe('a reading document', () => {
  it('is taken as it stands', () => {
    const json = plainDocument(undefined, { predict: [{ hotSideC: 50, deltaT: 30, I: 3 }], model: { form: 'auto', use: ['curves'] } });
    expect(documentOf(json)).toEqual(JSON.parse(JSON.stringify(json)));
  });

  it.each(['d01', 'd02', 'd03', 'd04', 'd05', 'd06', 'd07', 'd08', 'd09', 'd10'])('of the drawn chart %s is taken', (name) => {
    expect(drawn(name).charts).toHaveLength(1);
  });

  it('may hold everything the contract names', () => {
    const full = {
      ...plainDocument([
        {
          ...heatChart(),
          frame: 'upright',
          curves: [
            { value: 0.7, start: [241.6, 563.5] },
            { value: 1.4, start: [357.1, 482.4], through: [[300.2, 520]] },
            { value: 2.1, points: [[357.1, 482.4]], by: 'path', start: [1, 2], through: [] },
          ],
        },
      ]),
      module: {
        ...module,
        variant: 'sealed',
        stages: 1,
        couples: 127,
        coldPlateMm: [30, 30],
        hotPlateMm: [30, 34],
        heightMm: 3.6,
        maxTemperatureC: 120,
        leadsOhm: 0.012,
        rated: [
          {
            hotSideC: 27,
            imaxA: 3.4,
            vmaxV: 15.4,
            qmaxW: 28.9,
            dTmaxK: 66,
            imaxMeans: 'largestDeltaT',
            basis: 'typical',
            atmosphere: 'vacuum',
            tolerancePercent: 10,
          },
        ],
        acResistanceOhm: 3.9,
        acResistanceAtC: 25,
      },
      model: { form: 'leg', use: ['curves', 'ratings', 'acResistance'] },
    };
    expect(documentOf(full)).toEqual(full);
  });

  it('may leave marks, curves, model and predictions out', () => {
    const { marks: _marks, curves: _curves, ...bare } = heatChart();
    expect(documentOf(plainDocument([bare])).charts[0]!.marks).toBeUndefined();
  });
});

describe('an unknown key is refused by its name', () => {
  it.each([
    ['colour', { ...plainDocument(), colour: 1 }],
    ['module.maker', plainDocument(undefined, { module: { ...module, maker: 'x' } })],
    ['charts[0].hotsideC', chartWith({ hotsideC: 27 })],
    ['charts[0].x.log', chartWith({ x: { quantity: 'deltaT', unit: 'K', scale: 'linear', log: true } })],
    ['charts[0].family.scale', chartWith({ family: { quantity: 'I', unit: 'A', scale: 'linear' } })],
    [
      'charts[0].marks[1].z',
      chartWith({
        marks: [
          { px: [1, 2], x: 0 },
          { px: [1, 2], z: 0 },
        ],
      }),
    ],
    ['charts[0].curves[0].name', chartWith({ curves: [{ value: 1, points: [[1, 2]], name: 'a' }] })],
    ['predict[0].current', plainDocument(undefined, { predict: [{ hotSideC: 50, deltaT: 30, I: 3, current: 3 }] })],
    ['module.rated[0].toleranceK', plainDocument(undefined, { module: { ...module, rated: [{ toleranceK: 1 }] } })],
  ])('%s', (path, json) => {
    const refusal = refusalOf(json);
    expect(refusal.path).toBe(path);
    expect(refusal.message).toContain(`no key "${/[^.]+$/.exec(path)![0]}"`);
    expect(refusal.message).toContain('under "note"');
  });

  it('even __proto__', () => {
    const text = JSON.stringify(plainDocument()).replace('"version":1', '"version":1,"__proto__":{}');
    expect(refusalOf(JSON.parse(text)).path).toBe('__proto__');
  });

  it('before anything it made missing', () => {
    const { hotSideC: _side, ...sideless } = heatChart();
    expect(refusalOf(plainDocument([{ ...sideless, hotside: 27 }])).path).toBe('charts[0].hotside');
  });

  it('but not under "note", wherever a note stands', () => {
    const note = { anything: [1, { at: 'all' }] };
    const chart = heatChart();
    const noted = {
      ...plainDocument([
        {
          ...chart,
          note,
          x: { ...(chart['x'] as object), note },
          family: { ...(chart['family'] as object), note },
          curves: [{ value: 1, points: [[1, 2]], note }],
        },
      ]),
      module: { ...module, note },
      note,
    };
    expect(documentOf(noted)).toEqual(JSON.parse(JSON.stringify(noted)));
  });
});

describe('a fault is refused at its place with a sentence', () => {
  it.each<[string, string, unknown, RegExp]>([
    ['not an object', '', 5, /Give an object/],
    ['another format', 'format', { ...plainDocument(), format: 'other' }, /"format" must be "couplet.reading"/],
    ['another version', 'version', { ...plainDocument(), version: 2 }, /version 1/],
    ['no module', 'module', { ...plainDocument(), module: undefined }, /Give an object/],
    ['an empty part number', 'module.partNumber', plainDocument(undefined, { module: { vendor: 'x', partNumber: ' ' } }), /Give some text/],
    ['a rating of zero', 'module.rated[0].imaxA', plainDocument(undefined, { module: { ...module, rated: [{ imaxA: 0 }] } }), /above zero/],
    [
      'an unknown meaning',
      'module.rated[0].imaxMeans',
      plainDocument(undefined, { module: { ...module, rated: [{ imaxMeans: 'most' }] } }),
      /Use one of: largestDeltaT, mostHeat/,
    ],
    ['no axis', 'charts[0].x', chartWith({ x: undefined }), /Give an object/],
    ['an unknown quantity', 'charts[0].y.quantity', chartWith({ y: { quantity: 'Q', unit: 'W' } }), /Use one of: I, V, deltaT/],
    ['an unknown scale', 'charts[0].y.scale', chartWith({ y: { quantity: 'Qc', unit: 'W', scale: 'ln' } }), /Use one of: linear, log/],
    ['an unknown kind of frame', 'charts[0].frame', chartWith({ frame: 'skewed' }), /Use one of: upright, turned, perspective/],
    ['a mark without pixel', 'charts[0].marks[0].px', chartWith({ marks: [{ x: 0 }] }), /two numbers, \[x, y\]/],
    [
      'a pixel of three numbers',
      'charts[0].marks[2].px',
      chartWith({
        marks: [
          { px: [1, 2], x: 1 },
          { px: [1, 2], x: 1 },
          { px: [1, 2, 3], x: 1 },
        ],
      }),
      /two numbers/,
    ],
    ['a pixel of text', 'charts[0].marks[0].px[1]', chartWith({ marks: [{ px: [1, '2'], x: 1 }] }), /Give a number/],
    ['a number beyond any chart', 'charts[0].marks[0].x', chartWith({ marks: [{ px: [1, 2], x: 2e9 }] }), /No chart reads so far/],
    ['a curve without value', 'charts[0].curves[0].value', chartWith({ curves: [{ points: [[1, 2]] }] }), /Give a number/],
    ['a curve without points', 'charts[0].curves[0].points', chartWith({ curves: [{ value: 1, points: [] }] }), /at least one point/],
    ['a curve of nothing', 'charts[0].curves[0]', chartWith({ curves: [{ value: 1 }] }), /needs "points", or a pixel to "start" from/],
    [
      'through without start',
      'charts[0].curves[0].through',
      chartWith({ curves: [{ value: 1, points: [[1, 2]], through: [[1, 2]] }] }),
      /also needs the pixel where it starts/,
    ],
    ['an unknown form', 'model.form', plainDocument(undefined, { model: { form: 'cubic' } }), /Use one of: auto, constant, shaped, leg/],
    ['nothing to use', 'model.use', plainDocument(undefined, { model: { use: [] } }), /at least one thing/],
    ['a prediction without side', 'predict[0]', plainDocument(undefined, { predict: [{ deltaT: 3, I: 1 }] }), /give hotSideC or coldSideC/],
    [
      'a prediction with both sides',
      'predict[1]',
      plainDocument(undefined, {
        predict: [
          { hotSideC: 30, deltaT: 3, I: 1 },
          { hotSideC: 30, coldSideC: 2, deltaT: 3, I: 1 },
        ],
      }),
      /give hotSideC or coldSideC/,
    ],
    ['a prediction without drive', 'predict[0]', plainDocument(undefined, { predict: [{ hotSideC: 30, deltaT: 3 }] }), /give I or V/],
    [
      'a prediction with current and voltage',
      'predict[0]',
      plainDocument(undefined, { predict: [{ hotSideC: 30, deltaT: 3, I: 1, V: 1 }] }),
      /give I or V/,
    ],
    [
      'a prediction below absolute zero',
      'predict[0].deltaT',
      plainDocument(undefined, { predict: [{ hotSideC: 30, deltaT: 400, I: 1 }] }),
      /colder than −273\.15\u00A0°C/,
    ],
  ])('%s', (_, path, json, message) => {
    const refusal = refusalOf(json);
    expect(refusal.path).toBe(path);
    expect(refusal.message).toMatch(message);
    expect(refusal.message).toMatch(/^[A-Z"].*\.$/s);
  });

  it('a note deeper than a hash can follow', () => {
    const deep = JSON.parse('['.repeat(50_000) + ']'.repeat(50_000)) as unknown;
    expect(refusalOf({ ...plainDocument(), note: deep })).toEqual({ path: 'note', message: 'Keep a note at most 40 levels deep.' });
  });

  it('never with an exception, whatever the JSON', () => {
    for (const json of [null, [], '', 0, true, { charts: {} }, { ...plainDocument(), charts: [null] }, plainDocument([{}])]) {
      expect(parseReadingDocument(json).ok).toBe(false);
    }
  });
});

describe('the quantities of a chart', () => {
  const show = (x: string, y: string, family: string, side: object = { hotSideC: 27 }) => {
    const unit: Record<string, string> = { I: 'A', V: 'V', deltaT: 'K', Tc: 'C', Th: 'C', Qc: 'W', Qh: 'W', P: 'W', COP: '1' };
    const axis = (quantity: string) => ({ quantity, unit: unit[quantity] });
    return plainDocument([{ image: 'a.png', x: axis(x), y: axis(y), family: axis(family), ...side, marks: [], curves: [] }]);
  };

  it.each([
    ['deltaT', 'Qc', 'I'],
    ['I', 'Qc', 'deltaT'],
    ['Qc', 'deltaT', 'I'],
    ['I', 'deltaT', 'COP'],
    ['Tc', 'V', 'I'],
    ['V', 'I', 'deltaT'],
    ['V', 'Qh', 'Tc'],
    ['deltaT', 'P', 'V'],
  ])('may be %s, %s and %s', (x, y, family) => {
    expect(parseReadingDocument(show(x, y, family)).ok).toBe(true);
  });

  it.each([
    ['no thermal one', show('I', 'Qc', 'V')],
    ['two thermal ones', show('deltaT', 'Tc', 'I')],
    ['no electrical one', show('deltaT', 'Qc', 'P')],
    ['no answer', show('deltaT', 'I', 'I')],
    ['one twice', show('deltaT', 'Qc', 'deltaT')],
    ['the side that is held', show('Th', 'Qc', 'I')],
    ['the cold side that is held', show('Tc', 'Qc', 'I', { coldSideC: 5 })],
    ['both sides held', show('deltaT', 'Qc', 'I', { hotSideC: 27, coldSideC: 5 })],
    ['no side held', show('deltaT', 'Qc', 'I', {})],
  ])('may not be %s: refused at the chart', (_, json) => {
    const refusal = refusalOf(json);
    expect(refusal.path).toBe('charts[0]');
    expect(refusal.message).toMatch(/\.$/);
  });

  it('may be the other side', () => {
    expect(parseReadingDocument(show('Th', 'Qc', 'I', { coldSideC: 5 })).ok).toBe(true);
    expect(parseReadingDocument(show('Tc', 'Qc', 'I', { hotSideC: 27 })).ok).toBe(true);
  });
});

describe('the unit of an axis', () => {
  const rated = (entry: object) => ({ module: { ...module, rated: [entry] } });
  const withX = (x: object, rest: object = {}, chart: object = {}) => plainDocument([{ ...heatChart(), x, ...chart }], { ...rest });

  it.each([
    ['charts[0].x.unit', withX({ quantity: 'deltaT', unit: 'W' }), /deltaT cannot be in W; use one of: K, C, F/],
    ['charts[0].y.unit', plainDocument([{ ...heatChart(), y: { quantity: 'COP', unit: '%' } }]), /COP cannot be in %/],
    ['charts[0].x.of', withX({ quantity: 'deltaT', unit: '%' }), /add "of"/],
    ['charts[0].x.unit', withX({ quantity: 'deltaT', unit: 'K', of: 'dTmaxK' }, rated({ hotSideC: 27, dTmaxK: 70 })), /unit "1" or "%"/],
    [
      'charts[0].x.of',
      withX({ quantity: 'deltaT', unit: '1', of: 'imaxA' }, rated({ hotSideC: 27, imaxA: 5 })),
      /deltaT is not a share of imaxA/,
    ],
    ['charts[0].x.of', withX({ quantity: 'deltaT', unit: '1', of: 'dTmaxK' }), /no dTmaxK rated at 27\u00A0°C/],
    [
      'charts[0].x.of',
      withX({ quantity: 'deltaT', unit: '1', of: 'dTmaxK' }, rated({ hotSideC: 50, dTmaxK: 70 })),
      /no dTmaxK rated at 27\u00A0°C/,
    ],
    [
      'charts[0].x.of',
      withX({ quantity: 'deltaT', unit: '1', of: 'dTmaxK' }, rated({ hotSideC: 27, dTmaxK: 70 }), { hotSideC: undefined, coldSideC: 5 }),
      /only a chart with hotSideC/,
    ],
  ])('is refused at %s', (path, json, message) => {
    const refusal = refusalOf(json);
    expect(refusal.path).toBe(path);
    expect(refusal.message).toMatch(message);
  });

  it('may be a share of a rating at the side of the chart', () => {
    const json = withX({ quantity: 'deltaT', unit: '%', of: 'dTmaxK', scale: 'linear' }, rated({ hotSideC: 27, dTmaxK: 70 }));
    expect(parseReadingDocument(json).ok).toBe(true);
    expect(parseReadingDocument(plainDocument([voltageChart()])).ok).toBe(true);
  });
});
