import type { Rows, Vector } from '@/lib/numeric';
import type { Observation } from './types';

/** A fitted place: derivatives at the observations, their weights and the covariance (XᵀWX)⁻¹ that belongs to them. */
export interface FittedPlace {
  readonly jacobian: Rows;
  readonly weights: Vector;
  readonly information: Rows;
}

/**
 * What errors common to a whole chart, such as those of its marks, add to the covariance of the constants: each moves all
 * points of its chart by s at once and with them the constants by g = (XᵀWX)⁻¹ XᵀW s, so it adds g gᵀ (law of propagation, JCGM 100:2008,
 * eq. 13, for fully correlated inputs). Errors of different charts are independent.
 */
export function sharedCovariance(observations: readonly Observation[], place: FittedPlace): Rows {
  const moves = [...chartsOf(observations).values()].flatMap((members) => {
    const errors = Math.max(...members.map((i) => observations[i]!.shared?.length ?? 0));
    return Array.from({ length: errors }, (_, k) => moveOf(members, (i) => observations[i]!.shared?.[k] ?? 0, place));
  });
  return place.information.map((row, i) => row.map((_, j) => moves.reduce((sum, move) => sum + move[i]! * move[j]!, 0)));
}

function moveOf(members: readonly number[], error: (i: number) => number, { jacobian, weights, information }: FittedPlace): Vector {
  const score = information.map((_, j) => members.reduce((sum, i) => sum + jacobian[i]![j]! * weights[i]! * error(i), 0));
  return information.map((row) => row.reduce((sum, value, j) => sum + value * score[j]!, 0));
}

function chartsOf(observations: readonly Observation[]): ReadonlyMap<number, readonly number[]> {
  const charts = new Map<number, number[]>();
  observations.forEach(({ chart }, i) => {
    const members = charts.get(chart);
    if (members) members.push(i);
    else charts.set(chart, [i]);
  });
  return charts;
}
