import { maximaOf, responseOf, type ModelForm, type ModuleConstants } from '@/lib/module';
import { mean, quantile, rms } from '@/lib/numeric';
import { kelvin } from '@/lib/units';
import { observe } from './observable';
import type { Answer, ModuleFit, CurveResidual, Observation, PointResidual } from './types';
import { curveOf, sigmaOf } from './weights';

/** Everything a fit tells about what it leaves. */
export type Remainder = Pick<ModuleFit, 'residuals' | 'byCurve' | 'misfit' | 'rmsPercentOfQmax' | 'rmsPercentOfVmax'>;

interface Fitted {
  readonly form: ModelForm;
  readonly constants: ModuleConstants;
}

interface Left {
  readonly point: Observation;
  readonly residual: number;
}

/**
 * What a form leaves at every observation, omitted ones included, and along every curve. An observation at which
 * the model has no answer (COP where no power is taken up) is left out.
 */
export function remainderOf(
  constants: ModuleConstants,
  observations: readonly Observation[],
  floor: number,
  form: ModelForm = 'constant',
): Remainder {
  const fitted: Fitted = { form, constants };
  const left = observations.flatMap((point): Left[] => {
    const answer = observe(constants, point.answer, point, form);
    return answer === null ? [] : [{ point, residual: point.value - answer.value }];
  });
  const counted = left.filter(({ point }) => point.omitted !== true);
  const answering = (...answers: Answer[]) => counted.filter(({ point }) => answers.includes(point.answer));
  return {
    residuals: left.map((one) => pointResidual(one, floor)),
    byCurve: byCurve(counted),
    misfit: {
      heatW: rmsOrNull(counted.flatMap((one) => asHeat(one, fitted))),
      voltageV: rmsOrNull(counted.flatMap((one) => asVoltage(one, fitted))),
    },
    rmsPercentOfQmax: rmsOrNull(percentOfMaximum(answering('Qc', 'Qh'), fitted, 'qmaxW')),
    rmsPercentOfVmax: rmsOrNull(percentOfMaximum(answering('V'), fitted, 'vmaxV')),
  };
}

const rmsOrNull = (values: readonly number[]) => (values.length === 0 ? null : rms(values));

function pointResidual({ point, residual }: Left, floor: number): PointResidual {
  return {
    chart: point.chart,
    curve: point.curve,
    point: point.point,
    residual,
    percentOfRange: (100 * residual) / point.range,
    standardized: residual / sigmaOf(point, floor),
    omitted: point.omitted === true,
  };
}

function byCurve(counted: readonly Left[]): readonly CurveResidual[] {
  const curves = new Map<string, Left[]>();
  for (const one of counted) {
    const curve = curves.get(curveOf(one.point));
    if (curve) curve.push(one);
    else curves.set(curveOf(one.point), [one]);
  }
  return [...curves.values()].map((curve) => {
    const { chart, curve: number, answer, range } = curve[0]!.point;
    const residuals = curve.map(({ residual }) => residual);
    const spread = rms(residuals);
    return {
      chart,
      curve: number,
      answer,
      points: curve.length,
      rms: spread,
      mean: mean(residuals),
      rmsPercentOfRange: (100 * spread) / range,
    };
  });
}

/** A residual as the heat in W that would explain it: as it is for heat, times the power for COP. */
function asHeat({ point, residual }: Left, { form, constants }: Fitted): readonly number[] {
  if (point.answer === 'Qc' || point.answer === 'Qh') return [residual];
  return point.answer === 'COP' ? [residual * observe(constants, 'P', point, form)!.value] : [];
}

/** A residual as the voltage in V that would explain it: over the current for power, times dV/dI for a current. */
function asVoltage({ point, residual }: Left, { form, constants }: Fitted): readonly number[] {
  if (point.answer === 'V') return [residual];
  const I = observe(constants, 'I', point, form)?.value ?? 0;
  if (point.answer === 'I') return [residual * (responseOf(form, constants, I, point.Tc, point.Th)?.voltageByCurrent ?? NaN)];
  return point.answer === 'P' && I !== 0 ? [residual / I] : [];
}

/** Residuals of some answers in percent of the model's maximum at their chart's side. */
function percentOfMaximum(left: readonly Left[], { form, constants }: Fitted, maximum: 'qmaxW' | 'vmaxV'): readonly number[] {
  const charts = new Map<number, number>();
  for (const { point } of left) {
    if (charts.has(point.chart)) continue;
    const side = heldSide(left.filter((other) => other.point.chart === point.chart).map((other) => other.point));
    charts.set(point.chart, maximaOf(form, constants, kelvin(side))[maximum]);
  }
  return left.map(({ point, residual }) => (100 * residual) / charts.get(point.chart)!);
}

/** The temperature (K) that a chart holds: its hot side, or its cold side where only that is the same everywhere. */
function heldSide(chart: readonly Observation[]): number {
  const spread = (values: readonly number[]) => quantile(values, 1) - quantile(values, 0);
  const [hot, cold] = [chart.map(({ Th }) => Th), chart.map(({ Tc }) => Tc)];
  return spread(hot) <= spread(cold) ? mean(hot) : mean(cold);
}
