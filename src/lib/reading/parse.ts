import type { z } from 'zod';
import { readingDocument, type ReadingChart, type ReadingCurve, type ReadingDocument, type ReadingPrediction } from './document';
import { pathText, type Refusal } from './refused';
import { rolesOf } from './roles';
import { unitFault } from './values';

/** A document as it stands, or the first thing that is wrong with it. */
export type ParsedDocument = { readonly ok: true; readonly document: ReadingDocument } | ({ readonly ok: false } & Refusal);

const KINDS: Readonly<Record<string, string>> = {
  object: 'an object',
  array: 'a list',
  string: 'some text',
  number: 'a number',
  tuple: 'a list',
};

/** Sentences for faults that the schema itself has no words for. */
function plainSentence(issue: z.core.$ZodRawIssue): string {
  if (issue.code === 'invalid_type') return `Give ${KINDS[issue.expected] ?? `a value of type ${issue.expected}`} here.`;
  if (issue.code === 'too_big') return `Keep this at or below ${issue.maximum}.`;
  if (issue.code === 'too_small') return `Keep this at or above ${issue.minimum}.`;
  return 'This is not what the reading document has here.';
}

function refusalOf(issue: z.core.$ZodIssue): Refusal {
  if (issue.code === 'unrecognized_keys') {
    const key = issue.keys[0] ?? '';
    return {
      path: pathText([...issue.path, key]),
      message: `The reading document has no key "${key}" here: take it out, or keep it under "note".`,
    };
  }
  return { path: pathText(issue.path), message: issue.message };
}

/** Unknown keys come first: a mistyped key explains why another is missing. */
const firstOf = (issues: readonly z.core.$ZodIssue[]) => issues.find(({ code }) => code === 'unrecognized_keys') ?? issues[0];

const only = (first: unknown, second: unknown) => (first === undefined) !== (second === undefined);

function curveFault({ start, through, points }: ReadingCurve, path: string): Refusal | null {
  if (through !== undefined && start === undefined)
    return { path: `${path}.through`, message: 'A curve that goes through pixels also needs the pixel where it starts.' };
  if (start === undefined && points === undefined) return { path, message: 'A curve needs "points", or a pixel to "start" from.' };
  return null;
}

function chartFault(document: ReadingDocument, chart: ReadingChart, path: string): Refusal | null {
  const roles = rolesOf(chart);
  if (!roles.ok) return { path, message: roles.message };
  for (const place of ['x', 'y', 'family'] as const) {
    const fault = unitFault(chart[place], chart, document.module);
    if (fault) return { path: `${path}.${place}.${fault.key}`, message: fault.message };
  }
  return firstFault(chart.curves ?? [], (curve, at) => curveFault(curve, `${path}.curves[${at}]`));
}

function predictionFault({ hotSideC, coldSideC, deltaT, I, V }: ReadingPrediction, path: string): Refusal | null {
  if (!only(hotSideC, coldSideC)) return { path, message: 'A prediction needs one side: give hotSideC or coldSideC.' };
  if (!only(I, V)) return { path, message: 'A prediction needs the current or the voltage: give I or V.' };
  const coldest = coldSideC ?? (hotSideC ?? 0) - deltaT;
  const warmest = hotSideC ?? (coldSideC ?? 0) + deltaT;
  return Math.min(coldest, warmest) <= -273.15
    ? { path: `${path}.deltaT`, message: 'With this difference one side would be colder than −273.15\u00A0°C.' }
    : null;
}

function firstFault<T>(items: readonly T[], faultOf: (item: T, at: number) => Refusal | null): Refusal | null {
  for (const [at, item] of items.entries()) {
    const fault = faultOf(item, at);
    if (fault) return fault;
  }
  return null;
}

/**
 * Checks that a parsed JSON value is a reading document: its shape, its units and what each chart shows.
 * Pictures are not looked at, and what this version cannot do yet is not refused here: `read` does both.
 */
export function parseReadingDocument(json: unknown): ParsedDocument {
  const parsed = readingDocument.safeParse(json, { error: plainSentence });
  if (!parsed.success) {
    const issue = firstOf(parsed.error.issues);
    return { ok: false, ...(issue ? refusalOf(issue) : { path: '', message: 'This is not a reading document.' }) };
  }
  const document: ReadingDocument = parsed.data;
  const fault =
    firstFault(document.charts, (chart, at) => chartFault(document, chart, `charts[${at}]`)) ??
    firstFault(document.predict ?? [], (asked, at) => predictionFault(asked, `predict[${at}]`));
  return fault ? { ok: false, ...fault } : { ok: true, document };
}
