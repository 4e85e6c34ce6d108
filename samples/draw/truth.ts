import { stateOf, type Build } from './leg';
import { scattered, scatterOf, type Scatter } from './material';
import { peakOf, rootNear } from './root';

export const ZERO_CELSIUS = 273.15;

/** The four ratings as they follow from the truth at one hot side, with the meaning of Imax apart. A, V, W, K. */
export interface TrueRatings {
  readonly imaxLargestDeltaT: number;
  readonly imaxMostHeat: number;
  readonly vmaxV: number;
  readonly qmaxLargestDeltaT: number;
  readonly qmaxMostHeat: number;
  readonly dTmaxK: number;
}

/** A module as the drawings know it. Currents in A, hot side in °C, temperature difference in K. */
export interface Truth {
  readonly build: Build;
  heat(current: number, hotSideC: number, deltaT: number): number;
  voltage(current: number, hotSideC: number, deltaT: number): number;
  /** The difference at which no heat is pumped any more. */
  reach(current: number, hotSideC: number): number;
  /** The current of the largest difference. */
  imax(hotSideC: number): number;
  /** The least current that pumps any heat across a difference. */
  leastCurrent(hotSideC: number, deltaT: number): number;
  ratings(hotSideC: number): TrueRatings;
}

/** What a module is made of: legs as [side, height] in mm, the cold plate in mm, and the ΔTmax in K its material is good for. */
export interface Recipe {
  readonly seed: string;
  readonly couples: number;
  readonly legMm: readonly [number, number];
  readonly plateMm: readonly [number, number];
  readonly aimK: number;
  readonly aimAtC: number;
}

const CONTACT_OHM_M2 = 1e-10;
const PLATE_KELVIN_M2_PER_WATT = 2e-5;

const built = (recipe: Recipe, scatter: Scatter): Build => ({
  couples: recipe.couples,
  legAreaM2: (recipe.legMm[0] / 1000) ** 2,
  legLengthM: recipe.legMm[1] / 1000,
  contactOhmM2: CONTACT_OHM_M2,
  plateKelvinPerWatt: PLATE_KELVIN_M2_PER_WATT / ((recipe.plateMm[0] * recipe.plateMm[1]) / 1e6),
  material: scattered(scatter),
});

/** About the current of the largest difference, from the properties at 300 K: only a scale for searching. */
export const roughImax = ({ legAreaM2, legLengthM, material }: Build): number => {
  const { alpha, rho } = material(300);
  return (alpha * 232 * legAreaM2) / (rho * legLengthM);
};

function truthOf(build: Build): Truth {
  const state = (current: number, hotSideC: number, deltaT: number) =>
    stateOf(build, current, hotSideC + ZERO_CELSIUS - deltaT, hotSideC + ZERO_CELSIUS);
  const scale = roughImax(build);
  const heat: Truth['heat'] = (current, side, deltaT) => state(current, side, deltaT).heat;
  const voltage: Truth['voltage'] = (current, side, deltaT) => state(current, side, deltaT).voltage;
  const small = 1e-7 * Math.abs(heat(scale, 27, 0));
  const reach: Truth['reach'] = (current, side) => rootNear((deltaT) => heat(current, side, deltaT), 40, 5, small);
  const rated = new Map<number, TrueRatings>();
  const imaxAt: Truth['imax'] = (side) => peakOf((current) => reach(current, side), 0.7 * scale, 1.4 * scale, 1e-3 * scale);
  const rate = (side: number): TrueRatings => {
    const imax = imaxAt(side);
    const most = peakOf((current) => heat(current, side, 0), 0.7 * scale, 1.7 * scale, 1e-3 * scale);
    const dTmaxK = reach(imax, side);
    return {
      imaxLargestDeltaT: imax,
      imaxMostHeat: most,
      vmaxV: voltage(imax, side, dTmaxK),
      qmaxLargestDeltaT: heat(imax, side, 0),
      qmaxMostHeat: heat(most, side, 0),
      dTmaxK,
    };
  };
  return {
    build,
    heat,
    voltage,
    reach,
    imax: imaxAt,
    leastCurrent: (side, deltaT) => rootNear((current) => heat(current, side, deltaT), scale * (0.02 + deltaT / 400), 0.02 * scale, small),
    ratings: (side) => {
      const known = rated.get(side) ?? rate(side);
      rated.set(side, known);
      return known;
    },
  };
}

/** The truth of a recipe: its seeded material, with the heat conductivity set so that the wanted ΔTmax comes out. */
export function makeTruth(recipe: Recipe): Truth {
  const scatter = scatterOf(recipe.seed);
  const withKappa = (kappa: number) => truthOf(built(recipe, { ...scatter, factor: { ...scatter.factor, kappa } }));
  const missing = (kappa: number) => {
    const { reach, imax } = withKappa(kappa);
    return reach(imax(recipe.aimAtC), recipe.aimAtC) - recipe.aimK;
  };
  return withKappa(rootNear(missing, 1, 0.05, 0.02));
}
