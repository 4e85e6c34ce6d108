import { z } from 'zod';

export const rowId = z.coerce.number<number | string>().int().positive();
export const idParams = z.strictObject({ id: rowId });
export const instant = z.iso.datetime().describe('UTC instant');
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/);

/** RFC 9457 problem document; `detail` is a sentence to show a person. */
export const problem = z.looseObject({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  fields: z.record(z.string(), z.string()).optional().describe('a sentence for each field that is wrong'),
});
export type Problem = z.infer<typeof problem>;

/** Text a person types: trimmed, bounded, no control characters. */
export const line = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `Keep this within ${max} characters.`)
    .regex(/^[^\p{Cc}]*$/u, 'This holds characters that cannot be printed: type it again.');

export const paragraph = (max: number) => z.string().trim().max(max, `Keep this within ${max} characters.`);

export const isoDate = z.union([z.literal(''), z.iso.date('Write the date as year-month-day, like 2026-03-15.')]);

const PRINTED_DATE = 'Write the date as far as the sheet gives it: 2026-03-15, 2026-03 or 2026.';
const isCalendarDay = (text: string) => text.length < 10 || z.iso.date().safeParse(text).success;

/** A date as a sheet prints it: a day, a month, a year, or nothing. */
export const printedDate = z
  .string()
  .trim()
  .regex(/^(\d{4}(-(0[1-9]|1[0-2])(-\d{2})?)?)?$/, PRINTED_DATE)
  .refine(isCalendarDay, PRINTED_DATE);

export const READING_STATES = ['draft', 'handed-in', 'returned', 'approved', 'superseded', 'withdrawn'] as const;
export const readingState = z.enum(READING_STATES);
