import type { DecisionRecord, ModelRecord, ReadingRecord } from '@db';
import { COMPARED_AT_C, type CatalogueRow } from '@/lib/contracts';
import type { Candidate, CandidateModel } from '@/lib/duty';
import { impliedRatings } from '@/lib/fit';
import type { ReadingDocument, ReadingModel, ReadingResult } from '@/lib/reading';
import { toBase } from '@/lib/units';
import { moduleName } from '../parts';
import { haystackOf } from './words';

/** One approved module in memory: its row, what the words find it by, and what the duty search needs. */
export interface CatalogueEntry extends Candidate {
  readonly row: CatalogueRow;
  readonly name: string;
  readonly haystack: string;
  /** Longest plate side, mm; null when no plate is stated. */
  readonly sideMm: number | null;
  readonly readingModel: ReadingModel;
}

export interface SheetName {
  readonly title: string;
  readonly number: string;
}

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** The misfit in W and V that a result tells in percent of the model's maxima at the sides of its charts. */
function misfitOf({ rmsPercentOfQmax, rmsPercentOfVmax, derived, validity }: ReadingModel): CandidateModel['misfit'] {
  const [low, high] = validity.hotSideC;
  const shown = derived.filter(({ hotSideC }) => hotSideC >= low && hotSideC <= high);
  const part = (percent: number | null, key: 'qmaxW' | 'vmaxV') =>
    percent === null || shown.length === 0 ? null : (percent / 100) * mean(shown.map((row) => row[key].value));
  return { heatW: part(rmsPercentOfQmax, 'qmaxW'), voltageV: part(rmsPercentOfVmax, 'vmaxV') };
}

/** The model of a result as the duty search and the curves of a module page take it. */
export const toCandidateModel = (model: ReadingModel): CandidateModel => ({
  form: model.form,
  parameters: [model.alpha.value, model.R.value, model.K.value],
  covariance: model.covariance,
  misfit: misfitOf(model),
  tolerancePercent: model.tolerancePercent,
  validity: model.validity,
});

/** Currents of the curves that a reading document holds, A, smallest first; empty when its families are not currents. */
export function drawnCurrents({ charts }: ReadingDocument): number[] {
  const values = charts
    .filter(({ family }) => family.quantity === 'I' && family.of === undefined)
    .flatMap(({ family, curves = [] }) => curves.map(({ value }) => toBase(value, 'I', family.unit)));
  return [...new Set(values)].sort((a, b) => a - b);
}

/** Hot sides that charts are drawn for, °C, coldest first. */
export const drawnHotSides = ({ charts }: ReadingDocument): number[] =>
  [...new Set(charts.flatMap(({ hotSideC }) => hotSideC ?? []))].sort((a, b) => a - b);

const allowedCurrent = ({ ratings }: ReadingRecord['module']): number | null => {
  const allowed = ratings.flatMap(({ imaxMeans, imaxA }) => (imaxMeans === 'allowed' && imaxA !== null ? [imaxA] : []));
  return allowed.length === 0 ? null : Math.min(...allowed);
};

/** When a reading was last approved or restored. */
export const approvedAt = (readingId: number, decisions: readonly DecisionRecord[]): string | null =>
  decisions.findLast((it) => it.readingId === readingId && (it.what === 'approved' || it.what === 'restored'))?.at.toISOString() ?? null;

/** Makes the entry of an approved reading; null when its result holds no model, so that nothing can be said of it. */
export function toEntry(
  { reading, model }: { readonly reading: ReadingRecord; readonly model: ModelRecord },
  sheet: SheetName | undefined,
  decisions: readonly DecisionRecord[],
): CatalogueEntry | null {
  const readingModel = (JSON.parse(model.result) as ReadingResult).model;
  if (!readingModel) return null;
  const { module } = reading;
  const candidateModel = toCandidateModel(readingModel);
  const { imaxLargestDeltaT, vmaxV, qmaxW, dTmaxK } = impliedRatings(candidateModel, COMPARED_AT_C);
  const { id, vendor, partNumber, variant, stages, couples, coldPlateMm, hotPlateMm, heightMm } = module;
  const sides = [...(coldPlateMm ?? []), ...(hotPlateMm ?? [])];
  return {
    row: {
      id,
      vendor: { id: vendor.id, name: vendor.name },
      partNumber,
      variant,
      stages,
      couples,
      coldPlateMm,
      hotPlateMm,
      heightMm,
      grade: readingModel.grade,
      imax: imaxLargestDeltaT,
      vmax: vmaxV,
      qmax: qmaxW,
      dtmax: dTmaxK,
      approvedAt: approvedAt(reading.id, decisions),
    },
    name: moduleName(module),
    haystack: haystackOf([vendor.name, moduleName(module), sheet?.title ?? '', sheet?.number ?? '']),
    sideMm: sides.length === 0 ? null : Math.max(...sides),
    readingModel,
    model: candidateModel,
    maxTemperatureC: module.maxTemperatureC,
    allowedCurrentA: allowedCurrent(module),
  };
}
