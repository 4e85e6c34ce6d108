import { dutyTexts, type Duty } from '@/lib/duty';
import { currentForBestCop, lumpedAt } from '@/lib/module';
import { constantsOfModel, moduleOf, type ReadingModel } from '@/lib/reading';
import { celsius, toKelvin } from '@/lib/units';

const DELTA_T_K = 30;
/** Share of the largest heat of a module, where no current pumps any over the usual ΔT (a choice, no source). */
const SMALL_SHARE = 0.2;

const twoDigits = (value: number) => Number(value.toPrecision(2));

/** A duty that a module is good at, to begin with: ΔT 30 K at a hot side of the sheet and about the heat of its best COP there. */
export function suggestedDuty(model: ReadingModel, hotSideC: number): Duty {
  const [Th, Tc] = [toKelvin(celsius(hotSideC)), toKelvin(celsius(hotSideC - DELTA_T_K))];
  const current = currentForBestCop(lumpedAt(model.form, constantsOfModel(model), Tc, Th), Tc, Th) ?? 0;
  const heat = moduleOf(model).heat(current, Tc, Th);
  const qmax = model.derived[0]?.qmaxW.value ?? 1;
  return { heatW: twoDigits(heat > 0 ? heat : SMALL_SHARE * qmax), coldFaceC: hotSideC - DELTA_T_K, hotFaceC: hotSideC };
}

/** The address of the duty search for this module. */
export function dutyHref(moduleId: number, model: ReadingModel, hotSideC: number): string {
  return `/duty?${new URLSearchParams({ ...dutyTexts(suggestedDuty(model, hotSideC)), module: String(moduleId) }).toString()}`;
}
