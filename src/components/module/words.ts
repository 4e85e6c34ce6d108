import type { ModuleView } from '@/lib/contracts';
import type { ReadingModel } from '@/lib/reading';
import { formatNumber, formatWithUnit } from '@/lib/units';

const sides = (plate: readonly [number, number]) => `${formatNumber(plate[0])}\u00A0×\u00A0${formatNumber(plate[1])}`;

/** The plates in one line: "30 × 30 mm", both where they differ; null when none is stated. */
export function platesText({ coldPlateMm, hotPlateMm }: Pick<ModuleView, 'coldPlateMm' | 'hotPlateMm'>): string | null {
  const [cold, hot] = [coldPlateMm && sides(coldPlateMm), hotPlateMm && sides(hotPlateMm)];
  if (cold && hot && cold !== hot) return `cold ${cold}\u00A0mm, hot ${hot}\u00A0mm`;
  return cold || hot ? `${cold ?? hot}\u00A0mm` : null;
}

/** Vendor, couples and size behind a module's name. */
export function identityLine(module: ModuleView): string {
  const { vendor, stages, couples, heightMm } = module;
  const plates = platesText(module);
  const size = plates && heightMm !== null ? `${plates}, ${formatWithUnit(heightMm, 'mm')} high` : plates;
  return [vendor.name, stages !== null && stages > 1 && `${stages} stages`, couples !== null && `${couples} couples`, size]
    .filter(Boolean)
    .join(' · ');
}

/** What a sheet states of a module besides its ratings; null is not stated. */
export function identityRows(module: ModuleView): [string, string | null][] {
  const measured = (value: number | null, unit: string) => (value === null ? null : formatWithUnit(value, unit));
  const { acResistanceOhm, acResistanceAtC } = module;
  const at = acResistanceAtC === null ? '' : ` at ${formatWithUnit(acResistanceAtC, 'C')}`;
  return [
    ['Variant', module.variant || null],
    ['Stages', module.stages === null ? null : String(module.stages)],
    ['Couples', module.couples === null ? null : String(module.couples)],
    ['Plates', platesText(module)],
    ['Height', measured(module.heightMm, 'mm')],
    ['Sealing', module.sealing],
    ['Highest temperature', measured(module.maxTemperatureC, 'C')],
    ['Leads', measured(module.leadsOhm, 'ohm')],
    ['AC resistance', acResistanceOhm === null ? null : `${formatWithUnit(acResistanceOhm, 'ohm')}${at}`],
  ];
}

/** The temperature of every α, R and K that is not effective over a sheet. */
export const REFERENCE = formatWithUnit(27, 'C');

const FORMS: Readonly<Record<ReadingModel['form'], string>> = {
  constant: 'three constants',
  shaped: 'constants that follow the mean temperature',
  leg: 'legs that change along their length',
};

/** What a form of the model is, in a few words. */
export const formWords = (form: ReadingModel['form']): string => FORMS[form];

/** What the form leaves, in percent of the model's maxima. */
export function misfitText({ rmsPercentOfQmax, rmsPercentOfVmax }: ReadingModel): string | null {
  const part = (percent: number | null, of: string) =>
    percent !== null && `${formatWithUnit(percent, '%', { digits: 2 })}\u00A0of\u00A0${of}`;
  return [part(rmsPercentOfQmax, 'Qmax'), part(rmsPercentOfVmax, 'Vmax')].filter(Boolean).join(', ') || null;
}

/** "0 A to 3.5 A". */
export const rangeText = ([low, high]: readonly [number, number], unit: string): string =>
  `${formatWithUnit(Number(low.toPrecision(3)), unit)} to ${formatWithUnit(Number(high.toPrecision(3)), unit)}`;

/** A hash short enough for a line; the whole of it stands in its title. */
export const shortHash = (hash: string): string => `${hash.slice(0, 8)}…${hash.slice(-6)}`;

const BYTES_A_KB = 1024;
export const sizeText = (bytes: number): string => formatWithUnit(Math.max(1, Math.round(bytes / BYTES_A_KB)), 'kB');
