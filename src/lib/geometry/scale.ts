import type { Scale } from './types';

/** A value as the axis lays it out: itself on a linear axis, log10 of it on a log axis. */
export const laidOut = (value: number, scale: Scale): number => (scale === 'log' ? Math.log10(value) : value);

/** The value at a place along the axis; the inverse of {@link laidOut}. */
export const valueAt = (place: number, scale: Scale): number => (scale === 'log' ? 10 ** place : place);

/** How much the value changes along the axis: 1 on a linear axis, value · ln 10 on a log axis. */
export const valueSlope = (value: number, scale: Scale): number => (scale === 'log' ? value * Math.LN10 : 1);
