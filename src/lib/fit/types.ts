import { moduleOfForm, type ModelForm, type ModuleConstants, type ThermoelectricModule } from '@/lib/module';

/** What a chart can answer. */
export type Answer = 'Qc' | 'Qh' | 'P' | 'COP' | 'V' | 'I';

/** One point read from a chart, in base units (A, V, W, 1, K). I or V is given, never both; answer V needs I, answer I needs V. */
export interface Observation {
  /** Where it stands: numbers of chart, curve in the chart and point in the curve. */
  readonly chart: number;
  readonly curve: number;
  readonly point: number;
  /** Cold and hot face, K absolute. */
  readonly Tc: number;
  readonly Th: number;
  readonly I?: number | undefined;
  readonly V?: number | undefined;
  readonly answer: Answer;
  readonly value: number;
  /** Standard uncertainty of the value, the error of the other axis included by effective variance. */
  readonly u: number;
  /** Range of the answer's axis, positive. */
  readonly range: number;
  /** Set aside by a person: not fitted, not counted, but its residual is still told. */
  readonly omitted?: boolean | undefined;
}

/** What the model leaves at one point: read minus model. */
export interface PointResidual {
  readonly chart: number;
  readonly curve: number;
  readonly point: number;
  /** In base units of the answer. */
  readonly residual: number;
  /** In percent of the range of the answer's axis. */
  readonly percentOfRange: number;
  /** In standard uncertainties the fit worked with. */
  readonly standardized: number;
  readonly omitted: boolean;
}

/** What the model leaves along one curve, omitted points not counted. */
export interface CurveResidual {
  readonly chart: number;
  readonly curve: number;
  readonly answer: Answer;
  readonly points: number;
  /** Root mean square and mean of the residuals, in base units of the answer. */
  readonly rms: number;
  readonly mean: number;
  /** The same root mean square in percent of the range of the answer's axis. */
  readonly rmsPercentOfRange: number;
}

/** A form of the model fitted to every chart of a reading. */
export interface ModuleFit {
  readonly form: ModelForm;
  /** α in V/K, R in ohm, K in W/K: effective values over the sheet for the form constant, values at 300.15 K for the others. */
  readonly parameters: readonly [alpha: number, R: number, K: number];
  /** Covariance of the parameters, in their order: by curve or by information, whichever is larger. Errors shared by a chart (its marks) are not in it. */
  readonly covariance: readonly (readonly number[])[];
  readonly rank: number;
  readonly condition: number;
  /** Steps of Gauss-Newton; for the constant form 0 where the charts are linear in the parameters. */
  readonly iterations: number;
  readonly converged: boolean;
  readonly why: string;
  readonly residuals: readonly PointResidual[];
  readonly byCurve: readonly CurveResidual[];
  /** Root mean square of what the form leaves, as heat in W and as voltage in V; null where no chart shows it. */
  readonly misfit: { readonly heatW: number | null; readonly voltageV: number | null };
  /** Root mean square of heat residuals over the model's Qmax at their chart's side; null without heat charts. */
  readonly rmsPercentOfQmax: number | null;
  /** Root mean square of voltage residuals over the model's Vmax at their chart's side; null without voltage charts. */
  readonly rmsPercentOfVmax: number | null;
}

/** A fit of the constant form. */
export type ConstantFit = ModuleFit & { readonly form: 'constant' };

/** A fit, or one sentence on what is missing; then there are no parameters. */
export type FitOutcome<F extends ModuleFit = ModuleFit> =
  | { readonly ok: true; readonly fit: F }
  | { readonly ok: false; readonly missing: string; readonly rank: number; readonly condition: number };

/** A form with its constants and their covariance: all that predictions need; a {@link ModuleFit} is one. Constant where no form is named. */
export type FittedConstants = Pick<ModuleFit, 'parameters' | 'covariance'> & Partial<Pick<ModuleFit, 'form' | 'misfit'>>;

/** One value with how well it was read and what a delivered module may differ. */
export interface PredictedValue {
  readonly value: number;
  /** Standard uncertainty of the reading, with the form's misfit. */
  readonly uRead: number;
  /** One half width of the delivery tolerance; null when it is not stated. */
  readonly tolerance: number | null;
}

/** A value with its standard uncertainty and unit. */
export interface UncertainValue {
  readonly value: number;
  readonly u: number;
  readonly unit: string;
}

/** The constants by name. */
export const constantsOf = ({ parameters: [alpha, R, K] }: Pick<ModuleFit, 'parameters'>): ModuleConstants => ({ alpha, R, K });

/** The fitted module. */
export const moduleOfFit = (fit: Pick<FittedConstants, 'form' | 'parameters'>): ThermoelectricModule =>
  moduleOfForm(fit.form ?? 'constant', constantsOf(fit));
