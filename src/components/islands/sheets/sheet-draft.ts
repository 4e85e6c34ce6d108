import { printDate, readDate } from '@/components/sheets/dates';
import { sheetBody, type SheetBody, type SheetView } from '@/lib/contracts/parts';
import { checkBy, type Checked } from './checked';

/** What a person types about a sheet. */
export type SheetDraft = SheetBody;

export const emptySheet = (today: string, vendor = ''): SheetDraft => ({
  vendor,
  title: '',
  number: '',
  revision: '',
  dated: '',
  obtainedFrom: '',
  obtainedOn: today,
});

export const draftOfSheet = (sheet: SheetBody | SheetView): SheetDraft => ({
  vendor: sheet.vendor,
  title: sheet.title,
  number: sheet.number,
  revision: sheet.revision,
  dated: sheet.dated,
  obtainedFrom: sheet.obtainedFrom,
  obtainedOn: sheet.obtainedOn,
});

export const checkSheet = (draft: SheetDraft): Checked<SheetBody> =>
  checkBy(sheetBody, { ...draft, dated: readDate(draft.dated), obtainedOn: readDate(draft.obtainedOn) });

/** Name and words of everything a sheet states, for two versions side by side. */
export const sheetLines = (sheet: SheetBody): (readonly [string, string])[] => [
  ['Vendor', sheet.vendor],
  ['Title', sheet.title],
  ['Number', sheet.number],
  ['Revision', sheet.revision],
  ['Date', printDate(sheet.dated)],
  ['Obtained from', sheet.obtainedFrom],
  ['Obtained on', printDate(sheet.obtainedOn)],
];
