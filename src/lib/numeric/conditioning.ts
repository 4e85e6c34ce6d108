import { Matrix } from 'ml-matrix';
import type { Rows, Vector } from './types';

/** A design made ready for the solver, and the way its parameters go back: parameters = back · scaled parameters. */
export interface ConditionedDesign {
  readonly design: Matrix;
  readonly back: Matrix;
}

/** Rounding leaves this share of a column's length when everything else cancels. */
const ROUNDING = 16 * Number.EPSILON;

/**
 * Multiplies each row by the square root of its weight, centres every column on its weighted mean where another column is
 * constant (an intercept can take the means up), and gives every column the length one. This is what lets a polynomial of degree
 * ten be solved in double precision (Å. Björck, Numerical Methods for Least Squares Problems, SIAM 1996; from memory).
 * A column of nothing but rounding stays zero, so that the rank tells.
 */
export function conditionDesign(rows: Rows, weights: Vector): ConditionedDesign {
  const columns = rows[0]!.map((_, j) => rows.map((row) => row[j]!));
  const intercept = columns.findIndex((column) => column[0] !== 0 && column.every((x) => x === column[0]));
  const roots = weights.map(Math.sqrt);
  const back = Matrix.zeros(columns.length, columns.length);
  const design = new Matrix(rows.length, columns.length);
  columns.forEach((column, j) => {
    const centre = intercept < 0 || j === intercept ? 0 : weightedMean(column, weights);
    const centred = column.map((x, i) => (x - centre) * roots[i]!);
    const length = usefulLength(
      centred,
      column.map((x, i) => x * roots[i]!),
    );
    design.setColumn(
      j,
      centred.map((x) => (length === 0 ? 0 : x / length)),
    );
    back.set(j, j, length === 0 ? 1 : 1 / length);
    if (centre !== 0 && length !== 0) back.set(intercept, j, -centre / (length * columns[intercept]![0]!));
  });
  return { design, back };
}

function usefulLength(centred: Vector, original: Vector): number {
  const length = lengthOf(centred);
  return length > ROUNDING * lengthOf(original) ? length : 0;
}

const lengthOf = (column: Vector) => Math.sqrt(column.reduce((sum, x) => sum + x * x, 0));

function weightedMean(column: Vector, weights: Vector): number {
  let sum = 0;
  let total = 0;
  column.forEach((x, i) => {
    sum += x * weights[i]!;
    total += weights[i]!;
  });
  return total > 0 ? sum / total : 0;
}
