/** Least squares, roots, minima and statistics over plain arrays. */
export type * from './types';
