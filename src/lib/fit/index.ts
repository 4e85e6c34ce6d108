/** From points read off charts to the constants of a module, with uncertainty, and from those to predictions. */
export type * from './types';
export { constantsOf, moduleOfFit } from './types';
export { fitConstant, fitForm, fitLeg, fitShaped, type FitOptions } from './fit-form';
export { fitBest, type ChosenFit, type FormChoice, type FormScore } from './choice';
export { gainOf, type FitGain } from './gain';
export { impliedRatings, predict, type ImpliedRatings, type Prediction, type PredictionOptions, type PredictionPoint } from './predict';
export { MISFIT_FLOOR, POINTS_A_CURVE } from './weights';
