/** Widths of Roboto Flex in hundredths of the font size, as measured and rounded up: narrow signs, capitals, a few wide letters, all the rest. */
const NARROW = new Set([..." .,:;|!'()[]ijlrIft/·°\u00A0\u202F"]);
const WIDE = new Set([...'mwMWΩ%@']);
const CAPITAL = /\p{Lu}/u;

const hundredths = (letter: string): number => (NARROW.has(letter) ? 38 : WIDE.has(letter) ? 93 : CAPITAL.test(letter) ? 73 : 60);

/** A cautious width of a line of text, px: not less than what Roboto Flex takes at normal width and weight. */
export const textWidth = (text: string, fontPx: number): number =>
  ([...text].reduce((sum, letter) => sum + hundredths(letter), 0) * fontPx) / 100;
