import type { Px } from '@/lib/geometry';
import { unitSymbol } from '@/lib/units';
import type { Axis } from './axes';
import type { Panel } from './plan';
import type { DrawnLayer } from './panel';
import type { Box } from './spots';
import type { Style } from './style';
import { filled, strokes } from './svg';
import { drawText, textWidth } from './text';

type Segment = readonly [Px, Px];

const upright = (axis: Axis, values: readonly number[], from: number, to: number): Segment[] =>
  values.map((value) => [
    [axis.place(value), from],
    [axis.place(value), to],
  ]);
const level = (axis: Axis, values: readonly number[], from: number, to: number): Segment[] =>
  values.map((value) => [
    [from, axis.place(value)],
    [to, axis.place(value)],
  ]);

function drawGrid(x: Axis, y: Axis, { grid }: Style, box: Box): string {
  return [
    grid.fine ? strokes([...upright(x, x.fine, box.top, box.bottom), ...level(y, y.fine, box.left, box.right)], grid.fine) : '',
    grid.x ? strokes(upright(x, x.ticks, box.top, box.bottom), grid.x) : '',
    grid.y ? strokes(level(y, y.ticks, box.left, box.right), grid.y) : '',
  ].join('');
}

function drawFrame(style: Style, box: Box, right: boolean): string {
  const { left, top, right: end, bottom } = box;
  if (!style.frame.open) return filled(box, 'none', style.frame);
  const sides: Segment[] = [
    [
      [left, top],
      [left, bottom],
    ],
    [
      [left, bottom],
      [end, bottom],
    ],
  ];
  return strokes(
    right
      ? [
          ...sides,
          [
            [end, top],
            [end, bottom],
          ],
        ]
      : sides,
    style.frame,
  );
}

function drawTicks(x: Axis, y: Axis, second: Axis | undefined, style: Style, box: Box): string {
  const { length, minor } = style.tick;
  return [
    strokes([...upright(x, x.ticks, box.bottom, box.bottom + length), ...level(y, y.ticks, box.left, box.left - length)], style.frame),
    strokes(second ? level(second, second.ticks, box.right, box.right + length) : [], style.frame),
    strokes(
      minor ? [...upright(x, x.fine, box.bottom, box.bottom + minor), ...level(y, y.fine, box.left, box.left - minor)] : [],
      style.frame,
    ),
  ].join('');
}

function drawNumbers(x: Axis, y: Axis, second: Axis | undefined, style: Style, box: Box): string {
  const size = style.size.tick;
  const beyond = Math.max(0, style.tick.length) + 6;
  const text = (words: string, px: number, py: number, anchor: 'start' | 'middle' | 'end') =>
    drawText(words, { x: px, y: py, size, ink: style.ink, anchor }, style.face);
  return [
    ...x.ticks.map((value) => text(x.format(value), x.place(value), box.bottom + beyond + size + 2, 'middle')),
    ...y.ticks.map((value) => text(y.format(value), box.left - beyond - 2, y.place(value) + size / 2, 'end')),
    ...(second?.ticks ?? []).map((value) =>
      text(second?.format(value) ?? '', box.right + beyond + 2, (second?.place(value) ?? 0) + size / 2, 'start'),
    ),
  ].join('');
}

const NORMALISED: Readonly<Record<string, string>> = { qmaxW: 'Q_max', vmaxV: 'V_max', imaxA: 'I_max', dTmaxK: 'ΔT_max' };

/** "Heat pumped (W)", "COP", "Heat pumped (% of Q_max)". */
function axisWords(words: string, unit: string, of?: string): string {
  if (of) return `${words} (${unit === '1' ? 'share' : unit} of ${NORMALISED[of]})`;
  return unit === '1' ? words : `${words} (${unitSymbol(unit)})`;
}

function drawNames(panel: Panel, layers: readonly DrawnLayer[], style: Style, box: Box): string {
  const size = style.size.axis;
  const write = (words: string, x: number, y: number, upward: boolean) =>
    drawText(words, { x, y, size, ink: style.ink, anchor: 'middle', upward }, style.face);
  const middle = (box.top + box.bottom) / 2;
  const numbers = Math.max(...layers.flatMap(({ y }) => y.ticks.map((value) => textWidth(y.format(value), style.size.tick, style.face))));
  const away = Math.max(0, style.tick.length) + numbers + 20;
  const yNames = (['left', 'right'] as const).flatMap((side) => {
    const found = layers.find(({ layer }) => (layer.side ?? 'left') === side);
    if (!found) return [];
    const words = axisWords(style.words.y[found.layer.answer], found.layer.unit, found.layer.yOf);
    return [write(words, side === 'left' ? box.left - away : box.right + away + size, middle, true)];
  });
  const below = box.bottom + Math.max(0, style.tick.length) + style.size.tick + size + 22;
  return [write(axisWords(style.words.x[panel.x], panel.xUnit), (box.left + box.right) / 2, below, false), ...yNames].join('');
}

/** Paper, grid, frame, ticks, numbers, names and title of one panel. */
export function drawGround(panel: Panel, layers: readonly DrawnLayer[], style: Style, box: Box): string {
  const first = layers.find(({ layer }) => layer.side !== 'right') ?? layers[0];
  const second = layers.find(({ layer }) => layer.side === 'right')?.y;
  if (!first) return '';
  const title = { x: (box.left + box.right) / 2, y: box.top - 14, size: style.size.title, ink: style.ink, anchor: 'middle' as const };
  return [
    style.plot ? filled(box, style.plot) : '',
    drawGrid(first.x, first.y, style, box),
    drawFrame(style, box, second !== undefined),
    drawTicks(first.x, first.y, second, style, box),
    drawNumbers(first.x, first.y, second, style, box),
    drawNames(panel, layers, style, box),
    drawText(panel.title, title, style.face),
  ].join('');
}
