import type { FormChoice, PredictedValue, UncertainValue } from '@/lib/fit';
import type { FrameKind, Px } from '@/lib/geometry';
import type { ModelForm } from '@/lib/module';
import type { ReadingMark, ReadingPrediction } from './document';

/** Version of the program that reads; it is part of the result and of the approval hash. */
export const ENGINE = '1.1.0';

/** One point of a curve: its pixel and its values in the chart's own units and normalisation. */
export interface ReadPoint {
  readonly px: Px;
  readonly x: number;
  readonly y: number;
}

/** A stretch of a curve without ink, and why. Dash gaps are summed in one entry with `count`. */
export interface ReadGap {
  readonly from: Px;
  readonly to: Px;
  readonly why: 'label' | 'crossing' | 'marker' | 'dash';
  readonly count?: number;
}

/** A place where the program is not sure of a curve. */
export interface ReadDoubt {
  readonly px: Px;
  readonly why: 'crossing' | 'gap' | 'neighbour' | 'faint' | 'end';
  readonly text: string;
}

/** A curve as it was read; its value is null when the program found it unaided. */
export interface ReadCurve {
  readonly value: number | null;
  readonly by: 'hand' | 'followed' | 'path';
  readonly points: readonly ReadPoint[];
  readonly gaps: readonly ReadGap[];
  readonly doubts: readonly ReadDoubt[];
}

/** A chart as it was read. */
export interface ReadChart {
  readonly image: string;
  readonly fileSha256: string;
  readonly pixelsSha256: string;
  readonly frame: {
    readonly kind: FrameKind;
    readonly marks: readonly Pick<ReadingMark, 'px' | 'x' | 'y'>[];
    readonly residualPx: number | null;
  };
  readonly curves: readonly ReadCurve[];
}

/** Where the sheet says anything: outside these ranges a prediction is marked. A in A, K in K, °C. */
export interface Validity {
  readonly I: readonly [number, number];
  readonly deltaT: readonly [number, number];
  readonly hotSideC: readonly [number, number];
}

/** The ratings that follow from the model with the hot face held at one temperature. */
export interface DerivedRatings {
  readonly hotSideC: number;
  readonly imaxLargestDeltaT: UncertainValue;
  readonly imaxMostHeat: UncertainValue;
  readonly qmaxW: UncertainValue;
  readonly dTmaxK: UncertainValue;
  readonly vmaxV: UncertainValue;
  readonly Z: UncertainValue;
}

/** The model of a module: α, R, K between the outer faces with their uncertainty, and how far they hold. */
export interface ReadingModel {
  readonly form: ModelForm;
  readonly grade: 'curves' | 'ratings';
  /** `effective` over the sheet for the constant form, 300.15 K mean for the others. */
  readonly at: 'effective' | '300.15 K';
  readonly alpha: UncertainValue;
  readonly R: UncertainValue;
  readonly K: UncertainValue;
  /** d ln α/dT, d ln R/dT, d ln K/dT in 1/K. */
  readonly temperature: { readonly alphaPerK: number; readonly RPerK: number; readonly KPerK: number };
  readonly parameters: readonly { readonly name: string; readonly value: number; readonly unit: string }[];
  /** In the order of `parameters`. */
  readonly covariance: readonly (readonly number[])[];
  readonly rmsPercentOfQmax: number | null;
  readonly rmsPercentOfVmax: number | null;
  /** What a delivered module may differ from its sheet, half width in percent; null when the sheet does not say. */
  readonly tolerancePercent: number | null;
  readonly validity: Validity;
  readonly derived: readonly DerivedRatings[];
  /** How the form was chosen, with the numbers that spoke; only where the document leaves the choice to the program (`auto`). Since engine 1.1.0. */
  readonly choice?: FormChoice;
}

type Asked = Omit<ReadingPrediction, 'I' | 'V' | 'note'>;

/** The answers to one prediction, beside what was asked: of I and V the one given is a number, the other an answer; without a model a sentence. */
export type ReadPrediction =
  | (Asked & { readonly I?: number; readonly V?: number; readonly missing: string })
  | (Asked & {
      readonly inside: boolean;
      readonly I: number | PredictedValue;
      readonly V: number | PredictedValue;
      readonly Qc: PredictedValue;
      readonly Qh: PredictedValue;
      readonly P: PredictedValue;
      /** Null where no power is taken up or the state generates. */
      readonly COP: PredictedValue | null;
    });

/** One thing the program looked at, with its limits. */
export interface ReadCheck {
  readonly id: string;
  readonly verdict: 'fine' | 'doubt' | 'conflict';
  readonly value: number | null;
  readonly limit: readonly [number, number] | null;
  readonly text: string;
}

/** The result of reading one document, version 1. The same document and pictures give the same bytes. */
export interface ReadingResult {
  readonly format: 'couplet.result';
  readonly version: 1;
  readonly engine: string;
  readonly charts: readonly ReadChart[];
  readonly model: ReadingModel | null;
  /** One sentence; then the model is null. */
  readonly modelMissing: string | null;
  readonly predictions: readonly ReadPrediction[];
  readonly checks: readonly ReadCheck[];
}
