/** From points read off charts to the constants of a module, with uncertainty, and from those to predictions. */
export type * from './types';
export { constantsOf } from './types';
export { fitConstant, type FitOptions } from './constant';
export { impliedRatings, predict, type ImpliedRatings, type Prediction, type PredictionOptions, type PredictionPoint } from './predict';
export { MISFIT_FLOOR, POINTS_A_CURVE } from './weights';
