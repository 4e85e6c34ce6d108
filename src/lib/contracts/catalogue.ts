import { z } from 'zod';
import type { ReadingModel } from '@/lib/reading';
import { parseNumber, type ParseOptions } from '@/lib/units';
import { instant, line, rowId } from './common';
import { moduleView, pictureView } from './parts';
import { decisionView } from './readings';

/** All modules are compared with their hot side at this temperature, °C, which is the reference of every model. */
export const COMPARED_AT_C = 27;
export const ROWS_A_PAGE = 50;

export const CATALOGUE_SORTS = [
  'module',
  'vendor',
  'stages',
  'couples',
  'side',
  'height',
  'imax',
  'vmax',
  'qmax',
  'dtmax',
  'approved',
] as const;
export type CatalogueSort = (typeof CATALOGUE_SORTS)[number];
export const GRADES = ['measured', 'curves', 'ratings'] as const;

/** A number in an address, as a person types it into a form; empty is no limit. */
const typed = (options: ParseOptions) =>
  z
    .string()
    .max(40, 'That is too long for a number.')
    .optional()
    .transform((text, context) => {
      if (text === undefined || text.trim() === '') return undefined;
      const parsed = parseNumber(text, options);
      if (parsed.ok) return parsed.value;
      context.addIssue({ code: 'custom', message: parsed.message });
      return z.NEVER;
    });

/** One of a list in an address; empty is all of them. */
const choice = <const T extends readonly [string, ...string[]]>(names: T) =>
  z
    .union([z.literal(''), z.enum(names)], `Choose one of: ${names.join(', ')}.`)
    .optional()
    .transform((name) => (name === '' || name === undefined ? undefined : (name as T[number])));

const HEAT = { unit: 'W', min: 0, max: 10_000 };
const SIDE = { unit: 'mm', min: 0, max: 500 };

/** Filters, order and page of the catalogue, all of them in the address. */
export const catalogueQuery = z.strictObject({
  q: line(120)
    .optional()
    .transform((words) => words ?? '')
    .describe('words, or fragments of a part number; all have to be found'),
  vendor: z
    .union([z.literal(''), rowId])
    .optional()
    .transform((id) => (id === '' ? undefined : id)),
  heatFrom: typed(HEAT).describe(`Qmax of the model at ${COMPARED_AT_C} °C, W`),
  heatTo: typed(HEAT),
  sideFrom: typed(SIDE).describe('longest plate side, mm'),
  sideTo: typed(SIDE),
  stages: choice(['1', '2', '3']).describe('3 stands for three and more'),
  grade: choice(GRADES),
  unstated: choice(['show']).describe('show also those whose sheets do not state what is filtered by'),
  sort: choice(CATALOGUE_SORTS),
  order: choice(['ascending', 'descending']),
  page: typed({ min: 1, max: 100_000 }),
});
export type CatalogueQuery = z.infer<typeof catalogueQuery>;

export const CATALOGUE_PARAMS = Object.keys(catalogueQuery.shape) as readonly (keyof CatalogueQuery)[];

const uncertain = z.strictObject({ value: z.number(), u: z.number(), unit: z.string() });

export const catalogueRow = z.strictObject({
  id: rowId,
  vendor: z.strictObject({ id: rowId, name: z.string() }),
  partNumber: z.string(),
  variant: z.string(),
  stages: z.int().nullable(),
  couples: z.int().nullable(),
  coldPlateMm: z.tuple([z.number(), z.number()]).nullable(),
  hotPlateMm: z.tuple([z.number(), z.number()]).nullable(),
  heightMm: z.number().nullable(),
  grade: z.enum(GRADES),
  imax: uncertain.describe(`current of the largest ΔT with the hot side at ${COMPARED_AT_C} °C`),
  vmax: uncertain,
  qmax: uncertain,
  dtmax: uncertain,
  approvedAt: instant.nullable(),
});
export type CatalogueRow = z.infer<typeof catalogueRow>;

export const catalogueAnswer = z.strictObject({
  total: z.int().describe('approved modules in all'),
  found: z.int(),
  unstated: z.int().describe('left out because their sheets do not state what is filtered by'),
  page: z.int(),
  pages: z.int(),
  rows: z.array(catalogueRow),
});
export type CatalogueAnswer = z.infer<typeof catalogueAnswer>;

const model = z
  .custom<ReadingModel>((value) => typeof value === 'object' && value !== null)
  .describe('the model of a couplet.result, version 1');

/** The approved model of a module, with what it stands on. */
export const moduleModel = z.strictObject({
  module: moduleView,
  readingId: rowId,
  model,
  currents: z.array(z.number()).describe('A; those the sheet draws, else even steps'),
  hotSides: z.array(z.number()).describe('°C; those the sheet draws'),
  engine: z.string(),
  hash: z.string(),
  readBy: z.string(),
  approvedBy: z.string(),
  approvedAt: instant.nullable(),
  sheets: z.array(
    z.strictObject({
      id: rowId,
      title: z.string(),
      number: z.string(),
      revision: z.string(),
      dated: z.string(),
      obtainedFrom: z.string(),
      obtainedOn: z.string(),
    }),
  ),
  pictures: z.array(pictureView.extend({ sheetId: rowId.nullable(), label: z.string() })),
  history: z.array(decisionView),
});
export type ModuleModel = z.infer<typeof moduleModel>;
