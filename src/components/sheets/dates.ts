const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;

const two = (text: string) => text.padStart(2, '0');

function monthNumber(word: string): string | null {
  const at = MONTHS.findIndex((month) => word.toLowerCase().startsWith(month.toLowerCase()));
  return at < 0 ? null : two(String(at + 1));
}

type Rule = readonly [shape: RegExp, write: (...parts: string[]) => string | null];

const named = (word: string, write: (month: string) => string) => {
  const month = monthNumber(word);
  return month === null ? null : write(month);
};

/** Ways of writing a date that leave no doubt which number is the day; 03/04/2026 is not among them. */
const RULES: readonly Rule[] = [
  [/^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})$/, (year, month, day) => `${year}-${two(month!)}-${two(day!)}`],
  [/^(\d{1,2})\.\s?(\d{1,2})\.\s?(\d{4})$/, (day, month, year) => `${year}-${two(month!)}-${two(day!)}`],
  [/^(\d{1,2})\.? ([a-z]{3,9})\.?,? (\d{4})$/i, (day, word, year) => named(word!, (month) => `${year}-${month}-${two(day!)}`)],
  [/^([a-z]{3,9})\.? (\d{1,2}),? (\d{4})$/i, (word, day, year) => named(word!, (month) => `${year}-${month}-${two(day!)}`)],
  [/^(\d{4})[-/.](\d{1,2})$/, (year, month) => `${year}-${two(month!)}`],
  [/^(\d{1,2})[/.](\d{4})$/, (month, year) => `${year}-${two(month!)}`],
  [/^([a-z]{3,9})\.?,? (\d{4})$/i, (word, year) => named(word!, (month) => `${year}-${month}`)],
];

/** A date as people write it, as year-month-day, year-month or year; what cannot be read without doubt stays as typed. */
export function readDate(text: string): string {
  const typed = text.trim().replace(/\s+/g, ' ');
  for (const [shape, write] of RULES) {
    const parts = shape.exec(typed);
    const date = parts && write(...parts.slice(1));
    if (date) return date;
  }
  return typed;
}

/** `2026-03-15` as "15 Mar 2026", `2026-03` as "Mar 2026"; empty for nothing. */
export function printDate(date: string): string {
  const [year = '', month, day] = date.slice(0, 10).split('-');
  const name = month && MONTHS[Number(month) - 1];
  return [day && String(Number(day)), name, year].filter(Boolean).join('\u00a0');
}
