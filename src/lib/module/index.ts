/** Thermoelectric physics of a module: heat, voltage, COP, maxima, and the way back from ratings. */
export { MODEL_FORMS, type ByConstants, type ModelForm, type ModuleConstants, type ModuleMaxima } from './types';
export type { ModuleResponse, ThermoelectricModule } from './types';
export { figureOfMerit } from './constant';
export { constantModule, currentAtVoltage, lumpedAt, moduleOfForm, responseOf } from './forms';
export { temperatureCoefficients, type TemperatureCoefficients } from './coefficients';
export { largestDeltaTOf, maximaAtHotSide, maximaOf } from './maxima';
export { bestCop, currentForBestCop, currentForHeat, currentForMostHeat } from './currents';
export { numericCurrents, type NumericCurrents } from './numeric-currents';
export { constantsFromRatings, type ConstantsFromRatings, type ThreeRatings } from './ratings';
