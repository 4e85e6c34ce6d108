/** Thermoelectric physics of a module: heat, voltage, COP, maxima, and the way back from ratings. */
export type { ModuleConstants, ModuleMaxima, ThermoelectricModule } from './types';
export { constantModule, figureOfMerit } from './constant';
export { maximaAtHotSide } from './maxima';
export { bestCop, currentForBestCop, currentForHeat, currentForMostHeat } from './currents';
export { constantsFromRatings, type ConstantsFromRatings, type ThreeRatings } from './ratings';
