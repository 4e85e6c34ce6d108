import { mean as meanOf, median as medianOf, quantile as quantileOf, rootMeanSquare } from 'simple-statistics';
import type { Vector } from './types';

/** Arithmetic mean. Throws for no values. */
export const mean = (values: Vector): number => meanOf([...values]);

/** Median. Throws for no values. */
export const median = (values: Vector): number => medianOf([...values]);

/** Root mean square. Throws for no values. */
export const rms = (values: Vector): number => rootMeanSquare([...values]);

/** Quantile at a share from 0 to 1. Throws for no values or a share outside. */
export const quantile = (values: Vector, share: number): number => quantileOf([...values], share);
