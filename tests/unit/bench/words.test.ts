import { describe, expect, test } from 'vitest';
import { axisHead, decimalsAt, pixelText, placeWords, smallNumber, valueTexts } from '@/components/islands/bench/points/words';
import { emptyChart, type BenchChart } from '@/lib/editor';

const blank = emptyChart('c1', { id: 1, pixelsSha256: 'ab'.repeat(32), width: 1000, height: 700 });
const framed: BenchChart = {
  ...blank,
  x: { quantity: 'deltaT', unit: 'K', scale: 'linear' },
  y: { quantity: 'Qc', unit: 'W', scale: 'linear' },
  marks: [
    { id: 'm1', px: [60, 660], x: 0, y: 0 },
    { id: 'm2', px: [960, 60], x: 90, y: 30 },
  ],
};

describe('what stands beside the picture', () => {
  test('values have the decimals that tell one pixel from the next', () => {
    expect(decimalsAt(framed, [500, 300])).toEqual([2, 2]);
    expect(valueTexts(framed, [510, 360])).toEqual(['45.00', '15.00']);
    expect(decimalsAt({ ...framed, marks: framed.marks.map((mark) => ({ ...mark, x: mark.x! * 1000 })) }, [500, 300])![0]).toBe(0);
  });

  test('without a frame a place is told by its pixel, with one by its values and units', () => {
    expect(placeWords(blank, [12.34, 5])).toBe('pixel 12.3, 5.0');
    expect(placeWords(framed, [510, 360])).toBe('ΔT 45.00\u00A0K, Qc 15.00\u00A0W');
    expect(pixelText([0, 699.96])).toBe('0.0, 700.0');
  });

  test('the head of a column is the symbol over the unit, and over the rating where it is normalised', () => {
    expect([axisHead(framed, 'x'), axisHead(blank, 'y')]).toEqual(['ΔT / K', 'y']);
    expect(axisHead({ ...framed, y: { quantity: 'Qc', unit: '%', scale: 'linear', of: 'qmaxW' } }, 'y')).toBe('Qc/Qmax / %');
    expect(axisHead({ ...framed, y: { quantity: 'COP', unit: '1', scale: 'linear' } }, 'y')).toBe('COP');
  });

  test('a residual is told to two digits and no finer than a thousandth', () => {
    expect([smallNumber(0.1234), smallNumber(1e-9)]).toEqual(['0.12', 'under 0.001']);
  });
});
