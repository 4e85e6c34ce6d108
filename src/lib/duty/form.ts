import {
  constantModule,
  currentForHeat,
  currentForMostHeat,
  largestDeltaTOf,
  lumpedAt,
  maximaAtHotSide,
  moduleOfForm,
  numericCurrents,
  responseOf,
  type ModelForm,
  type ModuleConstants,
  type ThermoelectricModule,
} from '@/lib/module';
import { findRoot } from '@/lib/numeric';
import { kelvin, type Kelvin } from '@/lib/units';
import type { CandidateModel } from './types';

/** Slopes at one state. */
export interface Slopes {
  /** ∂Qc/∂I in W/A and ∂V/∂I in V/A. */
  readonly heatPerA: number;
  readonly voltPerA: number;
  /** Gradients of Qc and V at a fixed current by the parameters and then by what the form leaves of heat and of voltage. */
  readonly heat: readonly number[];
  readonly voltage: readonly number[];
}

/** What the search asks of a form of the model, whatever stands behind it. Current in A, faces in K. */
export interface Form {
  readonly module: ThermoelectricModule;
  /** The smaller current that pumps this heat (W), or null where none does. */
  currentForHeat(heatW: number, Tc: Kelvin, Th: Kelvin): number | null;
  /** The current of most heat, A. */
  currentForMostHeat(Tc: Kelvin, Th: Kelvin): number;
  /** The current at this voltage (V), A. */
  currentForVoltage(voltageV: number, Tc: Kelvin, Th: Kelvin): number;
  /** Current of the largest ΔT (A) and largest ΔT (K) with the hot face at Th. */
  largestDeltaT(Th: Kelvin): { readonly currentA: number; readonly deltaTK: number };
  /** ΔT (K) at which this current pumps no heat any more, with the hot face at Th; not positive where it pumps none at all. */
  deltaTWithoutHeat(I: number, Th: Kelvin): number;
  slopes(I: number, Tc: Kelvin, Th: Kelvin): Slopes;
}

/** The constant form, exact: heat and voltage are linear in α, R and K (see `constantModule`). */
function constantForm(constants: ModuleConstants): Form {
  const { alpha, R, K } = constants;
  return {
    module: constantModule(constants),
    currentForHeat: (heatW, Tc, Th) => currentForHeat(constants, heatW, Tc, Th),
    currentForMostHeat: (Tc) => currentForMostHeat(constants, Tc),
    currentForVoltage: (voltageV, Tc, Th) => (voltageV - alpha * (Th - Tc)) / R,
    largestDeltaT: (Th) => {
      const { imaxLargestDeltaT, dTmaxK } = maximaAtHotSide(constants, Th);
      return { currentA: imaxLargestDeltaT, deltaTK: dTmaxK };
    },
    // α (Th − ΔT) I − I²R/2 = K ΔT
    deltaTWithoutHeat: (I, Th) => (alpha * Th * I - (I * I * R) / 2) / (alpha * I + K),
    slopes: (I, Tc, Th) => ({
      heatPerA: alpha * Tc - I * R,
      voltPerA: R,
      heat: [Tc * I, -(I * I) / 2, Tc - Th, 1, 0],
      voltage: [Th - Tc, I, 0, 0, 1],
    }),
  };
}

const NO_SLOPES: Slopes = { heatPerA: NaN, voltPerA: NaN, heat: [NaN, NaN, NaN, 1, 0], voltage: [NaN, NaN, NaN, 0, 1] };

/** Coldest face at which a ΔT without heat is looked for, as a share of the hot face's temperature (below any module; our own choice). */
const COLDEST_SHARE = 0.45;

/** Any other form, by roots of its own heat: between faces that no current pumps heat over, what the lumped equations would say. */
function numericForm(form: ModelForm, constants: ModuleConstants): Form {
  const currents = numericCurrents(form, constants);
  const module = moduleOfForm(form, constants);
  const largest = new Map<Kelvin, { readonly currentA: number; readonly deltaTK: number }>();
  return {
    module,
    currentForHeat: currents.forHeat,
    currentForMostHeat: (Tc, Th) => currents.mostHeat(Tc, Th) ?? currentForMostHeat(lumpedAt(form, constants, Tc, Th), Tc),
    currentForVoltage: (voltageV, Tc, Th) => (Number.isFinite(voltageV) ? module.currentAtVoltage(voltageV, Tc, Th) : voltageV),
    largestDeltaT: (Th) => {
      const known = largest.get(Th);
      if (known) return known;
      const found = largestDeltaTOf(form, constants, Th);
      largest.set(Th, found);
      return found;
    },
    deltaTWithoutHeat: (I, Th) => {
      const heatOver = (deltaT: number) => module.heat(I, kelvin(Th - deltaT), Th);
      return heatOver(0) > 0 ? (findRoot(heatOver, 0, (1 - COLDEST_SHARE) * Th) ?? NaN) : heatOver(0);
    },
    slopes: (I, Tc, Th) => {
      const found = responseOf(form, constants, I, Tc, Th);
      if (found === null) return NO_SLOPES;
      const { heatByCurrent: heatPerA, voltageByCurrent: voltPerA, heatBy, voltageBy } = found;
      return { heatPerA, voltPerA, heat: [...heatBy, 1, 0], voltage: [...voltageBy, 0, 1] };
    },
  };
}

/** The form of a candidate's model. */
export function formOf({ form, parameters: [alpha, R, K] }: Pick<CandidateModel, 'form' | 'parameters'>): Form {
  return form === 'constant' ? constantForm({ alpha, R, K }) : numericForm(form, { alpha, R, K });
}
