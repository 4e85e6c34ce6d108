import type { ModuleView, PictureView, Rating, SheetView } from '@/lib/contracts';
import { editableNumber } from '@/components/ui/quantity-text';
import { formatNumber, formatWithUnit, NO_BREAK_SPACE, unitSymbol } from '@/lib/units';

const KILO = 1024;

const tenths = (value: number) => Math.round(10 * value) / 10;

/** A file's size: "312 kB", "1.4 MB". */
export function printBytes(bytes: number): string {
  if (bytes < KILO) return formatWithUnit(bytes, 'bytes');
  if (bytes < KILO * KILO) return formatWithUnit(Math.round(bytes / KILO), 'kB');
  return formatWithUnit(tenths(bytes / KILO / KILO), 'MB');
}

/** How much of a file has gone: "1.2 of 3.4 MB". */
export const printSent = (sent: number, total: number): string =>
  total < KILO * KILO
    ? `${formatNumber(Math.round(sent / KILO))} of ${printBytes(total)}`
    : `${formatNumber(sent / KILO / KILO, { decimals: 1 })} of ${printBytes(total)}`;

/** "PNG" for `image/png`. */
export const kindOfFile = (mediaType: string): string => mediaType.replace(/^image\//, '').toUpperCase();

export const printPixels = ({ width, height }: Pick<PictureView, 'width' | 'height'>): string =>
  `${formatNumber(width, { decimals: 0 })}${NO_BREAK_SPACE}×${NO_BREAK_SPACE}${formatNumber(height, { decimals: 0 })}${NO_BREAK_SPACE}px`;

export const count = (number: number, one: string, many = `${one}s`): string => `${number} ${number === 1 ? one : many}`;

type NamedSheet = Pick<SheetView, 'id' | 'title' | 'number' | 'revision'>;

/** "OC-118, rev. B", or nothing. */
export const numberAndRevision = ({ number, revision }: Pick<SheetView, 'number' | 'revision'>): string =>
  [number, revision && `rev.${NO_BREAK_SPACE}${revision}`].filter(Boolean).join(', ');

/** What a sheet is called: its title, or its number, or that it has neither. */
export const sheetTitle = (sheet: NamedSheet): string => sheet.title || numberAndRevision(sheet) || `Sheet${NO_BREAK_SPACE}${sheet.id}`;

export const partName = ({ partNumber, variant }: Pick<ModuleView, 'partNumber' | 'variant'>): string =>
  [partNumber, variant].filter(Boolean).join(' ');

/** A value as it was printed, with all its digits. */
export const exact = (value: number, unit: string): string => `${editableNumber(value)}${NO_BREAK_SPACE}${unitSymbol(unit)}`;

/** "40 × 40 mm", or null when the sheet does not state it. */
export const plateText = (plate: readonly [number, number] | null): string | null =>
  plate && `${editableNumber(plate[0])}${NO_BREAK_SPACE}×${NO_BREAK_SPACE}${exact(plate[1], 'mm')}`;

/** What is stated about a module's body, shortest first to read. */
export function moduleFacts(module: ModuleView): string[] {
  const { stages, couples, coldPlateMm, hotPlateMm, heightMm } = module;
  const sameFaces = coldPlateMm && hotPlateMm && coldPlateMm[0] === hotPlateMm[0] && coldPlateMm[1] === hotPlateMm[1];
  const cold = plateText(coldPlateMm);
  const hot = plateText(hotPlateMm);
  return [
    stages !== null && stages > 1 && count(stages, 'stage'),
    couples !== null && count(couples, 'couple'),
    sameFaces ? cold : cold && `cold plate ${cold}`,
    !sameFaces && hot && `hot plate ${hot}`,
    heightMm !== null && `${exact(heightMm, 'mm')} high`,
  ].filter((fact): fact is string => Boolean(fact));
}

/** "27 °C: 3.4 A, 15.4 V, 28.9 W, 66 K", without what is not stated. */
export function ratingText({ hotSideC, imaxA, vmaxV, qmaxW, dTmaxK }: Rating): string {
  const values = [
    imaxA !== null && exact(imaxA, 'A'),
    vmaxV !== null && exact(vmaxV, 'V'),
    qmaxW !== null && exact(qmaxW, 'W'),
    dTmaxK !== null && exact(dTmaxK, 'K'),
  ].filter(Boolean);
  return `${exact(hotSideC, 'C')}: ${values.join(', ') || 'not stated'}`;
}
