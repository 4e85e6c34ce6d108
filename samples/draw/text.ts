import { LETTERS } from './letters';

/** How the single-line alphabet is drawn: stroke as a share of the size, stretch of widths, slant in degrees. */
export interface Face {
  readonly weight: number;
  readonly stretch: number;
  readonly slant: number;
}

export interface Placing {
  readonly x: number;
  readonly y: number;
  /** Height of the capitals in pixels. */
  readonly size: number;
  readonly ink: string;
  readonly anchor?: 'start' | 'middle' | 'end';
  /** Quarter turn to the left, for the y axis. */
  readonly upward?: boolean;
}

const CAPITAL = 20;
const BESIDE = 4.8;
const LOW = { scale: 0.7, drop: 5 };

interface Run {
  readonly letter: string;
  readonly low: boolean;
}

/** Letters after an underscore stand low up to the next thing that is none: "Q_c at T_h = 27 °C", "I_max". */
function runsOf(text: string): readonly Run[] {
  const runs: Run[] = [];
  let low = false;
  for (const letter of text.replaceAll('\u00a0', ' ')) {
    low = letter === '_' || (low && /[a-z]/i.test(letter));
    if (letter !== '_') runs.push({ letter, low });
  }
  return runs;
}

function letterOf(letter: string) {
  const found = LETTERS[letter];
  if (!found) throw new Error(`The alphabet of the samples has no “${letter}”.`);
  return found;
}

const advance = ({ letter, low }: Run) => (letterOf(letter)[0] + BESIDE) * (low ? LOW.scale : 1);

/** Width of a text in pixels. */
export const textWidth = (text: string, size: number, face: Face): number =>
  ((runsOf(text).reduce((sum, run) => sum + advance(run), 0) - BESIDE) * size * face.stretch) / CAPITAL;

const trim = (value: number) => String(Math.round(value * 1000) / 1000);

/** A text as SVG paths. */
export function drawText(text: string, { x, y, size, ink, anchor = 'start', upward = false }: Placing, face: Face): string {
  const scale = size / CAPITAL;
  const shift = { start: 0, middle: -0.5, end: -1 }[anchor] * textWidth(text, size, face);
  let at = 0;
  const paths = runsOf(text).map((run) => {
    const d = letterOf(run.letter)[1];
    const place = run.low ? `translate(${trim(at)} ${LOW.drop}) scale(${LOW.scale})` : `translate(${trim(at)} 0)`;
    at += advance(run);
    return d && `<path transform="${place}" d="${d}"/>`;
  });
  const turn = upward ? ' rotate(-90)' : '';
  const slant = face.slant ? ` skewX(${-face.slant})` : '';
  return (
    `<g transform="translate(${trim(x)} ${trim(y)})${turn} translate(${trim(shift)} 0) scale(${trim(scale * face.stretch)} ${trim(scale)})${slant}" ` +
    `fill="none" stroke="${ink}" stroke-width="${trim(face.weight * CAPITAL)}" stroke-linecap="round" stroke-linejoin="round">${paths.join('')}</g>`
  );
}
