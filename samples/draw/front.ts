import type { Rating, SheetBody } from '@/lib/contracts';
import { finish } from './finish';
import type { Made, SheetPlan } from './plan';
import type { DrawnFile } from './sheet';
import { page, strokes } from './svg';
import { drawText, textWidth, type Face } from './text';

/** One column of the ratings table: heading and what stands in a row. */
type Column = readonly [heading: string, cell: (made: Made, rating: Rating) => string];

const number = (value: number | null, digits?: number) =>
  value === null ? '–' : digits === undefined ? String(value) : value.toFixed(digits);
const few = (value: number | null, most: number) => number(value, value !== null && value < 2 ? 2 : value !== null && value < most ? 1 : 0);
const plates = (mm: readonly number[] | null) => (mm ? mm.join(' × ') : '–');

const COLUMNS: readonly Column[] = [
  ['Module', (made) => nameOf(made)],
  ['Cold plate mm', ({ body }) => plates(body.coldPlateMm)],
  ['Hot plate mm', ({ body }) => plates(body.hotPlateMm)],
  ['Height mm', ({ body }) => number(body.heightMm, 1)],
  ['Couples', ({ body }) => number(body.couples)],
  ['T_h °C', (_, rating) => number(rating.hotSideC)],
  ['I_max A', (_, rating) => few(rating.imaxA, 1000)],
  ['V_max V', (_, rating) => few(rating.vmaxV, 1000)],
  ['Q_max W', (_, rating) => few(rating.qmaxW, 100)],
  ['ΔT_max K', (_, rating) => number(rating.dTmaxK)],
];

const MEANINGS = {
  largestDeltaT: 'I_max is the current of the largest temperature difference; Q_max is at that current and ΔT = 0.',
  mostHeat: 'I_max is the current of most heat at ΔT = 0, and Q_max that heat.',
  allowed: 'I_max is the highest current allowed.',
  notStated: '',
};
const BASES = {
  typical: 'Typical values',
  minimum: 'Least values',
  calculated: 'Calculated values',
  measured: 'Measured values',
  notStated: '',
};
const GASES = { vacuum: 'in vacuum', dryNitrogen: 'in dry nitrogen', air: 'in air', notStated: '' };

const nameOf = ({ body }: Made) => [body.partNumber, body.variant].filter(Boolean).join(', ');

/** What holds for the ratings, in sentences. */
function ratingNotes({ body }: Made): readonly string[] {
  const rating = body.ratings[0];
  const basis = rating ? [BASES[rating.basis], GASES[rating.atmosphere]].filter(Boolean).join(', ') : '';
  const tolerance = rating?.tolerancePercent ? `tolerance ±${rating.tolerancePercent} %` : '';
  const ratings = [basis, tolerance].filter(Boolean).join(', ');
  return [ratings && `${ratings}.`, rating ? MEANINGS[rating.imaxMeans] : ''].filter(Boolean);
}

/** What the sheet says of one module beside the table, in a sentence, or nothing. */
function moduleNote(made: Made): string {
  const { body } = made;
  const parts = [
    body.maxTemperatureC && `up to ${body.maxTemperatureC} °C`,
    body.sealing && `sealed with ${body.sealing}`,
    body.acResistanceOhm && `AC resistance without leads ${body.acResistanceOhm} Ω at ${body.acResistanceAtC} °C`,
    body.leadsOhm && `leads ${body.leadsOhm} Ω`,
  ].filter(Boolean);
  return parts.length > 0 ? `${nameOf(made)}: ${parts.join('; ')}.` : '';
}

/** "OC-118, rev. B, 2024-02-19". */
const headLine = ({ number: name, revision, dated }: SheetBody) =>
  [name, revision.length > 0 && revision.length < 4 ? `rev. ${revision}` : revision, dated].filter(Boolean).join(', ');

const EDGE = 48;
const ROW = 30;

/** Column widths that fit their widest text, with a gap; the rest is shared out. */
function columnWidths(rows: readonly (readonly string[])[], face: Face, room: number): readonly number[] {
  const widths = COLUMNS.map(([heading], at) => {
    const words = [...heading.split(/ (?=\S+$)/), ...rows.map((row) => row[at] ?? '')];
    return 18 + Math.max(...words.map((text) => textWidth(text, 9.5, face)));
  });
  const spare = (room - widths.reduce((sum, width) => sum + width, 0)) / widths.length;
  return widths.map((width) => width + Math.max(0, spare));
}

/** The first page of a sheet: what it is, and the ratings of its modules as printed. */
export async function drawFront(sheet: SheetPlan, modules: readonly Made[]): Promise<DrawnFile> {
  const { style } = sheet;
  const width = 1100;
  const rows = modules.flatMap((made) => made.body.ratings.map((rating) => COLUMNS.map(([, cell]) => cell(made, rating))));
  const widths = columnWidths(rows, style.face, width - 2 * EDGE);
  const lefts = widths.map((_, at) => EDGE + widths.slice(0, at).reduce((sum, each) => sum + each, 0));
  const notes = [...new Set([...modules.map(moduleNote).filter(Boolean), ...modules.flatMap(ratingNotes)])];
  const write = (words: string, x: number, y: number, size: number) => drawText(words, { x, y, size, ink: style.ink }, style.face);
  const tableTop = 150;
  const tableEnd = tableTop + 44 + rows.length * ROW;
  const height = Math.round(tableEnd + 40 + notes.length * 26 + 40);
  const rule = (y: number, thickness: number) =>
    strokes(
      [
        [
          [EDGE, y],
          [width - EDGE, y],
        ],
      ],
      { ink: style.ink, width: thickness },
    );
  const heads = COLUMNS.flatMap(([heading], at) =>
    heading.split(/ (?=\S+$)/).map((words, line) => write(words, lefts[at] ?? 0, tableTop + 14 + line * 17, 9.5)),
  );
  const cells = rows.flatMap((row, line) =>
    row.map((words, at) => write(words, lefts[at] ?? 0, tableTop + 44 + ROW * (line + 0.5) + 5, 10)),
  );
  const content = [
    write(sheet.body.vendor, EDGE, 62, 21),
    write(sheet.body.title, EDGE, 96, 13),
    write(headLine(sheet.body), EDGE, 122, 9.5),
    rule(tableTop - 8, 1.6),
    ...heads,
    rule(tableTop + 42, 0.9),
    ...cells,
    rule(tableEnd + 6, 1.6),
    ...notes.map((note, at) => write(note, EDGE, tableEnd + 38 + 26 * at, 9)),
  ].join('');
  const file = `${sheet.slug}-ratings.${style.finish.file}`;
  return {
    name: file,
    title: 'Ratings',
    bytes: await finish(page(width, height, style.paper, style.turnDegrees, content), style.finish, file),
  };
}
