import type { Px } from '@/lib/geometry';
import { unitSymbol } from '@/lib/units';
import type { DrawnLayer } from './panel';
import type { Layer } from './plan';
import { clearestCorner, spotsBeside, type Box } from './spots';
import type { Line, Style } from './style';
import { blob, filled, strokes } from './svg';
import { drawText, textWidth } from './text';

interface Entry {
  readonly words: string;
  readonly line: readonly Px[];
  readonly pen: Line;
  readonly index: number;
}

/** "0.7 A", "20 K", "60 %". */
const familyText = ({ family, familyUnit }: Layer, value: number): string =>
  `${value} ${family === 'deltaT' ? unitSymbol(familyUnit) : familyUnit}`;

const entriesOf = (layers: readonly DrawnLayer[], style: Style): readonly Entry[] =>
  layers.flatMap(({ layer, curves }) => {
    const pens = style.inks[layer.ink ?? 0] ?? [];
    return curves.map(({ value, line }, index) => {
      const pen = pens[index % pens.length] ?? { ink: style.ink, width: 1.5 };
      return { words: familyText(layer, value), line, pen, index };
    });
  });

function labelsBeside(entries: readonly Entry[], style: Style, frame: Box): string {
  const size = style.size.label;
  const sizes = entries.map(({ words }) => [textWidth(words, size, style.labelFace), size] as const);
  const spots = spotsBeside(
    entries.map(({ line }) => line),
    sizes,
    frame,
    [],
  );
  return entries
    .map(({ words, pen }, at) => {
      const spot = spots[at] ?? frame;
      const ink = style.inks.length > 1 ? pen.ink : style.ink;
      return drawText(words, { x: spot.left, y: spot.bottom, size, ink }, style.labelFace);
    })
    .join('');
}

function legend(entries: readonly Entry[], style: Style, frame: Box): string {
  const size = style.size.label;
  const row = size + 11;
  const width = 62 + Math.max(...entries.map(({ words }) => textWidth(words, size, style.labelFace)));
  const box = clearestCorner(
    entries.map(({ line }) => line),
    width,
    row * entries.length + 10,
    frame,
  );
  const rows = [...entries].reverse().map(({ words, pen, index }, at) => {
    const y = box.top + 5 + row * (at + 0.5);
    const [from, to] = [box.left + 9, box.left + 41];
    return (
      strokes(
        [
          [
            [from, y],
            [to, y],
          ],
        ],
        pen,
      ) +
      (style.markers ? blob([(from + to) / 2, y], index, pen.ink) : '') +
      drawText(words, { x: to + 10, y: y + size / 2, size, ink: style.ink }, style.labelFace)
    );
  });
  return filled(box, style.paper, { ink: style.frame.ink, width: 1 }) + rows.join('');
}

/** Says which curve is which: beside the lines, or in a legend where it is clearest. */
export function drawLabels(layers: readonly DrawnLayer[], style: Style, frame: Box): string {
  const entries = entriesOf(layers, style);
  return style.labels === 'legend' ? legend(entries, style, frame) : labelsBeside(entries, style, frame);
}
