import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

// Contrast ratio and its limits: WCAG 2.2, "contrast ratio", "relative luminance", success criteria 1.4.3 and 1.4.11.
type Tokens = Readonly<Record<string, string>>;

const css = readFileSync(new URL('../../../src/styles/tokens.css', import.meta.url), 'utf8');

/** The declarations of every block whose selector list, media query included, ends with these words. */
function blocks(): { selector: string; tokens: Tokens }[] {
  return [...css.replace(/\/\*[\s\S]*?\*\//g, '').matchAll(/([^{}]+)\{([^{}]*)\}/g)].map(([, selector = '', body = '']) => ({
    selector: selector.trim().replace(/\s+/g, ' '),
    tokens: Object.fromEntries([...body.matchAll(/--([\w-]+):\s*(#[0-9a-f]+);/g)].map(([, name = '', value = '']) => [name, value])),
  }));
}

const byTheme = (selector: string): Tokens => blocks().find((block) => block.selector === selector)!.tokens;
const light = byTheme(":root, [data-theme='light']");
const dark = byTheme("[data-theme='dark']");
const fromSystem = byTheme(':root:not([data-theme])');
const printed = byTheme(":root, :root:not([data-theme]), [data-theme='dark']");

function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((channel) => (channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4)) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [bright, dim] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (bright + 0.05) / (dim + 0.05);
}

/** Text colours with the grounds they stand on. */
const TEXT: readonly (readonly [string, readonly string[]])[] = [
  ['ink', ['paper', 'surface', 'faint', 'wash', 'attention-wash', 'approved-wash']],
  ['muted', ['paper', 'surface', 'faint', 'wash', 'attention-wash', 'approved-wash']],
  ['paper', ['ink', 'muted']],
  ['cold', ['paper', 'surface']],
  ['hot', ['paper', 'surface']],
  ['attention', ['paper', 'surface', 'attention-wash']],
  ['approved', ['paper', 'surface', 'approved-wash']],
  ['curve-1', ['wash']],
];

/** Lines, edges and marks that carry meaning, with what is behind them. */
const GRAPHICS: readonly (readonly [string, readonly string[]])[] = [
  ['control', ['paper', 'surface', 'faint', 'wash', 'attention-wash', 'approved-wash']],
  ['ink', ['paper', 'surface', 'faint']],
  ...['curve-1', 'curve-2', 'curve-3', 'plum', 'cold', 'hot', 'middle'].map((name) => [name, ['paper', 'surface']] as const),
  ['curve-2', ['faint', 'wash']],
  ['attention', ['attention-wash', 'surface']],
  ['approved', ['approved-wash']],
];

describe.each([
  ['light', light],
  ['dark', dark],
  ['printed', printed],
])('in the %s theme', (_name, tokens) => {
  test.each(TEXT.flatMap(([text, grounds]) => grounds.map((ground) => [text, ground] as const)))(
    '%s text on %s has at least 4.5 to 1',
    (text, ground) => {
      expect(contrast(tokens[text]!, tokens[ground]!)).toBeGreaterThanOrEqual(4.5);
    },
  );

  test.each(GRAPHICS.flatMap(([mark, grounds]) => grounds.map((ground) => [mark, ground] as const)))(
    '%s lines on %s have at least 3 to 1',
    (mark, ground) => {
      expect(contrast(tokens[mark]!, tokens[ground]!)).toBeGreaterThanOrEqual(3);
    },
  );
});

test('the dark theme of the system is the dark theme that a person chooses', () => {
  expect(fromSystem).toEqual(dark);
});

test('every theme has every token', () => {
  expect(Object.keys(dark)).toEqual(Object.keys(light));
  expect(Object.keys(printed)).toEqual(Object.keys(light));
  expect(Object.keys(light).length).toBeGreaterThan(18);
});

test('every colour that Tailwind offers is a token', async () => {
  const { default: config } = (await import('../../../tailwind.config.mjs')) as { default: { theme: { colors: Tokens } } };
  const used = Object.values(config.theme.colors).flatMap((value) => /var\(--([\w-]+)\)/.exec(value)?.[1] ?? []);
  expect(used.sort()).toEqual(Object.keys(light).sort());
});
