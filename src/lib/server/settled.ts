import type { ReadingState } from '@db';

const SETTLED: ReadonlySet<ReadingState> = new Set(['approved', 'superseded', 'withdrawn']);

/** Whether a reading was once approved, and so is for everybody to see. */
export const isSettled = (state: ReadingState): boolean => SETTLED.has(state);
