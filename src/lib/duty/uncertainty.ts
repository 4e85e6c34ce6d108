import type { Kelvin } from '@/lib/units';
import type { Form } from './form';
import { workingPoint } from './working-point';
import type { CandidateModel, DoubtfulValue, WorkingPoint } from './types';

type Gradient = readonly number[];
type Covariance = readonly (readonly number[])[];

/** Covariance of the parameters with, as two more independent ones, what the form leaves of heat and of voltage. */
export function wholeCovariance({ covariance, misfit }: Pick<CandidateModel, 'covariance' | 'misfit'>): Covariance {
  const size = covariance.length;
  const variances = [(misfit.heatW ?? 0) ** 2, (misfit.voltageV ?? 0) ** 2];
  const added = variances.map((variance, k) => Array.from({ length: size + 2 }, (_, at) => (at === size + k ? variance : 0)));
  return [...covariance.map((row) => [...row, 0, 0]), ...added];
}

/** Standard uncertainty of a value with this gradient: √(g C gᵀ) (JCGM 100:2008, 5.2.2 eq. 13); null where it is not finite. */
export function standardUncertainty(gradient: Gradient, covariance: Covariance): number | null {
  const variance = gradient.reduce((sum, gi, i) => sum + gradient.reduce((row, gj, j) => row + gi * gj * covariance[i]![j]!, 0), 0);
  return Number.isFinite(variance) ? Math.sqrt(Math.max(0, variance)) : null;
}

const scaled = (by: number, gradient: Gradient) => gradient.map((part) => by * part);
const sum = (a: Gradient, b: Gradient) => a.map((part, i) => part + b[i]!);

/**
 * How the parameters move current and COP while the heat stays the wanted one: from Qc(I, p) = const follows dI/dp = −(∂Qc/∂p)/(∂Qc/∂I),
 * then dV/dp = ∂V/∂p + ∂V/∂I dI/dp, dP/dp = I dV/dp + V dI/dp and dCOP/dp = −(COP/P) dP/dp.
 */
export function gradientsAtHeat(form: Form, { currentA: I, voltageV: V, powerW, cop }: WorkingPoint, Tc: Kelvin, Th: Kelvin) {
  const slopes = form.slopes(I, Tc, Th);
  const current = scaled(-1 / slopes.heatPerA, slopes.heat);
  const voltage = sum(slopes.voltage, scaled(slopes.voltPerA, current));
  const power = sum(scaled(I, voltage), scaled(V, current));
  return { heat: slopes.heat, current, cop: cop === null ? null : scaled(-cop / powerW, power) };
}

/** What a module at the low end of its tolerance needs: the sheet's current for heat/(1 − tolerance); null without a tolerance or out of reach. */
export function lowEndPoint(form: Form, model: CandidateModel, heatW: number, Tc: Kelvin, Th: Kelvin): WorkingPoint | null {
  const tolerance = model.tolerancePercent === null ? 1 : model.tolerancePercent / 100;
  if (tolerance >= 1) return null;
  const current = form.currentForHeat(heatW / (1 - tolerance), Tc, Th);
  return current === null ? null : workingPoint(form.module, current, Tc, Th);
}

/** Current, COP and heat of a working point with the uncertainty of the reading and what the tolerance makes of them. */
export function doubtsAt(
  form: Form,
  model: CandidateModel,
  heatW: number,
  point: WorkingPoint,
  low: WorkingPoint | null,
  Tc: Kelvin,
  Th: Kelvin,
) {
  const gradients = gradientsAtHeat(form, point, Tc, Th);
  const covariance = wholeCovariance(model);
  const u = (gradient: Gradient) => standardUncertainty(gradient, covariance);
  const current: DoubtfulValue = { value: point.currentA, u: u(gradients.current), tolerance: low && low.currentA - point.currentA };
  // the module that needs low.powerW still pumps heatW, not the sheet's heat at that current
  const lowCop = low !== null && low.powerW > 0 ? heatW / low.powerW : null;
  const cop: DoubtfulValue | null =
    point.cop === null || gradients.cop === null
      ? null
      : { value: point.cop, u: u(gradients.cop), tolerance: lowCop === null ? null : point.cop - lowCop };
  const heat: DoubtfulValue = {
    value: heatW,
    u: u(gradients.heat),
    tolerance: model.tolerancePercent === null ? null : (heatW * model.tolerancePercent) / 100,
  };
  return { current, cop, heat };
}
