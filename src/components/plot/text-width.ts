/** Widths of Roboto Flex in hundredths of the font size: digits and most letters near 55, a few far off it. */
const NARROW = new Set([..." .,:;|!'()[]ijlIft/·\u00A0\u202F"]);
const WIDE = new Set([...'mwMWQOΔΩ%@']);

/** A cautious width of a line of text, px: never less than what Roboto Flex at normal width takes. */
export const textWidth = (text: string, fontPx: number): number =>
  ([...text].reduce((sum, letter) => sum + (NARROW.has(letter) ? 34 : WIDE.has(letter) ? 88 : 61), 0) * fontPx) / 100;
